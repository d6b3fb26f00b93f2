import { describe, expect, test } from 'vitest';
import { BATTEN } from '../../../../src/lib/components/batten/measures';
import { limiterWord, words } from '../../../../src/lib/components/batten/words';
import { createAxis } from '../../../../src/lib/components/charts/axis';
import { textWidth } from '../../../../src/lib/components/charts/textWidth';
import { LIMITERS } from '../../../../src/lib/engine';
import { at, hoursFixture, runs } from '../../../fixtures/hours';

const hours = hoursFixture();
const wide = createAxis(hours, 12);
const said = (all: ReturnType<typeof words>) => all.map((it) => it.text);
const day = (stretches: Parameters<typeof runs>[0][number]) => runs([stretches]);
const today = [hours.days[0]];

describe('the word of a limiter', () => {
	test('is the limiter’s own, for every one of them', () => {
		const known = LIMITERS.filter((it) => it !== 'none' && it !== 'noData');
		for (const limiter of known) expect(limiterWord({ limiter, missing: null })).toBe(limiter);
	});

	test('names what is missing, once', () => {
		expect(limiterWord({ limiter: 'noData', missing: 'dew point' })).toBe('no dew point');
		expect(limiterWord({ limiter: 'noData', missing: 'no dew point' })).toBe('no dew point');
		expect(limiterWord({ limiter: 'noData', missing: null })).toBe('no data');
	});

	test('is nothing where nothing limits', () => {
		expect(limiterWord({ limiter: 'none', missing: null })).toBe('');
	});
});

describe('words on a lath', () => {
	test('one is set where it fits with 3 px to spare, and not where it does not', () => {
		const width = textWidth('wind', BATTEN.list.word, 500);
		const slots = Math.ceil((width + 6) / 3);
		const fitting = [
			{ from: 0, to: 40, state: 'open', limiter: 'none', missing: null },
			{ from: 40, to: 40 + slots, state: 'shut', limiter: 'wind', missing: null }
		] as const;
		const [open, shut] = fitting;
		expect(said(words(fitting, today, wide, BATTEN.list))).toEqual(['wind']);
		expect(words([open, { ...shut, to: shut.to - 1 }], today, wide, BATTEN.list)).toEqual([]);
	});

	test('tape asks for 5 px at each side and a bolder word', () => {
		const run = { from: 0, to: 40, state: 'tight', limiter: 'wind', missing: null } as const;
		const [word] = words([run], today, wide, BATTEN.list);
		expect(word).toMatchObject({ on: 'tape', width: textWidth('wind', 13.5, 600) });
	});

	test('dark and hours say nothing on lists, and their word on the first answer', () => {
		const night = day([
			['00:00', 'shut dark'],
			['12:00', 'shut hours']
		]);
		expect(words(night, today, wide, BATTEN.list)).toEqual([]);
		expect(said(words(night, today, wide, BATTEN.first))).toEqual(['dark', 'hours']);
	});

	test('a word stands by day where the day has room', () => {
		const [word] = words(day([['00:00', 'shut wind']]), today, wide, BATTEN.list);
		const [from, to] = [wide.x(at(0, '05:45')), wide.x(at(0, '21:15'))];
		expect(word.x).toBeCloseTo((from + to) / 2, 6);
	});

	test('a reason that outlasts a day is given once on each', () => {
		const long = runs([[['00:00', 'shut wind']], [['00:00', 'shut wind']]]);
		expect(said(words(long, hours.days, wide, BATTEN.list))).toEqual(['wind', 'wind']);
	});

	test('a word keeps clear of a block, or is left out', () => {
		const tape = day([
			['00:00', 'shut hours'],
			['08:00', 'tight wind'],
			['14:00', 'shut hours']
		]);
		const covered = { from: at(0, '08:00'), to: at(0, '10:30') };
		const [word] = words(tape, today, wide, BATTEN.list, covered);
		expect(word.x - word.width / 2).toBeGreaterThanOrEqual(wide.x(covered.to) + 5);
		const most = { from: at(0, '08:00'), to: at(0, '13:00') };
		expect(words(tape, today, wide, BATTEN.list, most)).toEqual([]);
	});

	test('a missing thing with a name too long for its place is said to be no data', () => {
		const gap = (to: number) => ({
			from: 0,
			to,
			state: 'shut' as const,
			limiter: 'noData' as const,
			missing: 'hours after the forecast ends'
		});
		expect(said(words([gap(90)], today, wide, BATTEN.list))).toEqual([
			'no hours after the forecast ends'
		]);
		expect(said(words([gap(20)], today, wide, BATTEN.list))).toEqual(['no data']);
		expect(words([gap(6)], today, wide, BATTEN.list)).toEqual([]);
	});
});
