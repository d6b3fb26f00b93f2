import { describe, expect, test } from 'vitest';
import type { LimitReadingRow } from '../../../../src/lib/api/reading';
import { limitReadingSchema } from '../../../../src/lib/api/reading';
import { boundWords, originWords, valueOf } from '../../../../src/lib/components/reading/rowWords';
import { RULER, rulerFill } from '../../../../src/lib/components/reading/ruler';
import { LIMIT_NAMES } from '../../../../src/lib/engine';
import { USUAL_UNITS } from '../../../../src/lib/units/quantity';

const START = '2026-05-13T13:45:00.000Z';

function row(more: Partial<LimitReadingRow> = {}): LimitReadingRow {
	return limitReadingSchema.parse({
		limit: 'gust',
		limiter: 'wind',
		phase: 'apply',
		face: 'port bottom',
		value: 9,
		bound: 10.3,
		side: 'most',
		unit: 'metresPerSecond',
		room: 1.3,
		scaledRoom: 0.5,
		holds: true,
		origin: 'forecast',
		at: START,
		usualError: 2.6,
		...more
	});
}

describe('the ruler of room', () => {
	test('is taped under one usual error and painted over it, a tick for each', () => {
		expect(rulerFill(row())).toEqual({ kind: 'taped', length: 0.5 * RULER.tick });
		expect(rulerFill(row({ room: 5.2 }))).toEqual({ kind: 'painted', length: 2 * RULER.tick });
		expect(rulerFill(row({ room: 2.6 })).kind).toBe('painted');
	});

	test('runs off past four, also where the engine only says three or more', () => {
		expect(rulerFill(row({ room: 11 }))).toEqual({ kind: 'runsOff' });
		expect(rulerFill(row({ room: null, usualError: null, scaledRoom: 3 }))).toEqual({
			kind: 'runsOff'
		});
		expect(rulerFill(row({ room: null, usualError: null, scaledRoom: 1.8 })).kind).toBe('painted');
	});

	test('is bare to the left of the limit where there is less than none', () => {
		expect(rulerFill(row({ room: -1.3 }))).toEqual({ kind: 'bare', length: 0.5 * RULER.tick });
		expect(rulerFill(row({ room: -26 }))).toEqual({ kind: 'bare', length: RULER.limit });
	});

	test('of what is only in or out is all or nothing', () => {
		const inOrOut = { side: 'in', room: null, scaledRoom: null, usualError: null } as const;
		expect(rulerFill(row({ ...inOrOut, holds: true })).kind).toBe('runsOff');
		expect(rulerFill(row({ ...inOrOut, holds: false }))).toEqual({
			kind: 'bare',
			length: RULER.limit
		});
	});

	test('of a missing value says that nothing is known', () => {
		expect(rulerFill(row({ value: null, room: null, scaledRoom: null })).kind).toBe('unknown');
	});
});

describe('words of a row', () => {
	const zone = 'Europe/Lisbon';

	test('where the number is from, and of which face where there are several', () => {
		expect(originWords(row(), START, zone, true)).toBe('forecast, port bottom');
		expect(originWords(row(), START, zone, false)).toBe('forecast');
	});

	test('when it binds, if that is later than the quarter-hour', () => {
		const later = row({ phase: 'wet', origin: 'derived', at: '2026-05-13T16:00:00.000Z' });
		expect(originWords(later, START, zone, true)).toBe('derived, port bottom, at 17:00 until dry');
	});

	test('the bound with its side and unit', () => {
		expect(boundWords(row(), USUAL_UNITS)).toBe('gust, most 20.0\u00a0kn');
		const spread = row({ limit: 'spread', side: 'least', bound: 3, unit: 'kelvin' });
		expect(boundWords(spread, USUAL_UNITS)).toBe('spread, least 3.0\u00a0°C');
		expect(boundWords(row({ limit: 'daylight', side: 'in', bound: null }), USUAL_UNITS)).toBe(
			'daylight'
		);
	});

	test('the value, inside or outside, or that there is none', () => {
		expect(valueOf(row(), USUAL_UNITS)).toEqual({ number: '17.5', unit: 'kn' });
		expect(valueOf(row({ value: null, side: 'in' }), USUAL_UNITS).number).toBe('inside');
		expect(valueOf(row({ value: null, side: 'in', holds: false }), USUAL_UNITS).number).toBe(
			'outside'
		);
		expect(valueOf(row({ value: null }), USUAL_UNITS).number).toBe('no data');
	});

	test('every limit of the engine has words', () => {
		for (const limit of LIMIT_NAMES) {
			expect(boundWords(row({ limit, bound: null }), USUAL_UNITS)).not.toBe('');
		}
	});
});
