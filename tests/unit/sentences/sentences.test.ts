import { describe, expect, test } from 'vitest';
import type { Sentence } from '../../../src/lib/api/sentence';
import type { Limiter } from '../../../src/lib/engine';
import { closing } from '../../../src/lib/sentences/closing';
import { finding } from '../../../src/lib/sentences/finding';
import {
	headline,
	subline,
	type SpokenDay,
	type SpokenStep
} from '../../../src/lib/sentences/headline';
import { readingDetail, readingTitle, type ReadingFacts } from '../../../src/lib/sentences/reading';
import { spokenBatten } from '../../../src/lib/sentences/spokenBatten';
import { counted, list } from '../../../src/lib/sentences/words';

const text = (sentence: Sentence): string => sentence.map((span) => span.text).join('');
const timeZone = 'Europe/Lisbon';
const open = (
	from: string,
	to: string,
	before: Limiter = 'dew',
	after: Limiter = 'wind',
	room = 2
) => ({
	from: `2026-05-13T${from}:00Z`,
	to: `2026-05-13T${to}:00Z`,
	before,
	after,
	room
});
const step = (changes: Partial<SpokenStep> = {}): SpokenStep => ({
	step: 'coat 2',
	boat: 'Tansy',
	face: 'starboard topsides',
	coat: true,
	hours: open('08:45', '13:15'),
	shutBy: 'wind',
	...changes
});
const day = (steps: SpokenStep[], changes: Partial<SpokenDay> = {}): SpokenDay => ({
	day: 'tomorrow',
	timeZone,
	steps,
	forecast: 'known',
	...changes
});

describe('the headline', () => {
	const CASES: [string, SpokenDay, string][] = [
		[
			'one coat',
			day([step()]),
			'Tomorrow: coat 2 on Tansy’s starboard topsides from 09:45, brush down by 14:15. Dew shuts it before, wind after.'
		],
		[
			'one coat today',
			day([step()], { day: 'today' }),
			'Today: coat 2 on Tansy’s starboard topsides from 09:45, brush down by 14:15. Dew shuts it before, wind after.'
		],
		[
			'a boat that ends in s',
			day([step({ boat: 'Iris' })]),
			'Tomorrow: coat 2 on Iris’ starboard topsides from 09:45, brush down by 14:15. Dew shuts it before, wind after.'
		],
		[
			'work that is no coat',
			day([step({ coat: false, step: 'wash', face: 'bottom' })]),
			'Tomorrow: wash on Tansy’s bottom from 09:45, done by 14:15. Dew shuts it before, wind after.'
		],
		[
			'only the day’s own ends',
			day([step({ hours: open('08:45', '13:15', 'hours', 'dark') })]),
			'Tomorrow: coat 2 on Tansy’s starboard topsides from 09:45, brush down by 14:15.'
		],
		[
			'one limiter on both sides',
			day([step({ hours: open('08:45', '13:15', 'wind', 'wind') })]),
			'Tomorrow: coat 2 on Tansy’s starboard topsides from 09:45, brush down by 14:15. Wind shuts it before and after.'
		],
		[
			'several coats',
			day([step(), step({ hours: open('07:00', '14:00') })]),
			'Tomorrow, coats go on from 08:00; brushes down by 15:00. Dew shuts them before, wind after.'
		],
		[
			'coats before other work',
			day([step(), step(), step({ coat: false, hours: open('05:00', '18:00') })]),
			'Tomorrow, coats go on from 09:45; brushes down by 14:15. Dew shuts them before, wind after.'
		],
		[
			'several of other work',
			day([step({ coat: false }), step({ coat: false })]),
			'Tomorrow, work goes on from 09:45; done by 14:15. Dew shuts them before, wind after.'
		],
		[
			'one of two fits',
			day([step(), step({ hours: null })]),
			'Tomorrow: coat 2 on Tansy’s starboard topsides from 09:45, brush down by 14:15. Dew shuts it before, wind after.'
		],
		[
			'nothing fits for wind',
			day([step({ hours: null })]),
			'Nothing can go on tomorrow: wind shuts the day.'
		],
		[
			'nothing fits for rain today',
			day([step({ hours: null, shutBy: 'rain' })], { day: 'today' }),
			'Nothing can go on today: rain shuts the day.'
		],
		[
			'the yard is closed',
			day([step({ hours: null, shutBy: 'hours' })]),
			'Tomorrow the yard is shut.'
		],
		[
			'data are missing',
			day([step({ hours: null, shutBy: 'noData' })]),
			'Nothing can go on tomorrow: missing data shuts the day.'
		],
		[
			'no forecast',
			day([step({ hours: null })], { forecast: 'none' }),
			'No forecast has come yet, so no hour can be called open.'
		],
		['no jobs', day([]), 'No jobs are queued yet.']
	];
	test.each(CASES)('%s', (_, input, expected) => expect(text(headline(input))).toBe(expected));

	test('times and boats are set apart', () => {
		const roles = headline(day([step()])).filter(({ role }) => role !== 'plain');
		expect(roles).toEqual([
			{ text: 'Tansy', role: 'boat' },
			{ text: '09:45', role: 'time' },
			{ text: '14:15', role: 'time' }
		]);
	});
});

describe('the line under it', () => {
	const gale = { name: 'Friday', gust: '37 kn', rainFrom: '2026-05-15T02:00:00Z' };
	const CASES: [
		string,
		SpokenDay,
		typeof gale | null | { name: string; gust: string; rainFrom: null },
		string
	][] = [
		[
			'a wet gale',
			day([step()]),
			gale,
			'Friday is a high-wind day: rain from 03:00 and gusts to 37 kn.'
		],
		[
			'a dry gale tomorrow',
			day([step()]),
			{ name: 'tomorrow', gust: '15 m/s', rainFrom: null },
			'Tomorrow is a high-wind day: gusts to 15 m/s.'
		],
		[
			'two that fit',
			day([
				step({ hours: open('08:45', '13:15', 'dew', 'wind', 1) }),
				step({ step: 'wash', boat: 'Merrow' })
			]),
			null,
			'2 steps of 2 fit tomorrow; most room: wash on Merrow. '
		],
		['one that fits says no more', day([step()]), null, ''],
		[
			'no jobs',
			day([]),
			null,
			'A job is a queue of steps on one side of a boat. Its hours show here.'
		]
	];
	test.each(CASES)('%s', (_, input, highWind, expected) =>
		expect(text(subline({ ...input, highWind }))).toBe(expected)
	);
});

describe('what shuts a stretch', () => {
	const CASES: [Limiter, Limiter, string][] = [
		['dew', 'wind', 'Dew shuts it before, wind after.'],
		['hours', 'rain', 'Rain shuts it after.'],
		['damp', 'dark', 'Damp air shuts it before.'],
		['none', 'none', ''],
		['wet', 'wet', 'A wet face shuts it before and after.']
	];
	test.each(CASES)('%s before, %s after', (before, after, expected) =>
		expect(closing(before, after)).toBe(expected)
	);
});

describe('a batten spoken', () => {
	test('each day is open, tight or shut with its reason', () => {
		const spoken = spokenBatten(
			'coat 2, starboard topsides',
			'Tansy',
			[
				{ name: 'today', hours: { ...open('08:45', '13:15'), tight: false }, shutBy: 'dew' },
				{
					name: 'tomorrow',
					hours: { ...open('08:45', '13:15', 'hours', 'rain'), tight: true },
					shutBy: 'dew'
				},
				{ name: 'Friday', hours: null, shutBy: 'wind' }
			],
			timeZone
		);
		expect(spoken).toBe(
			'coat 2, starboard topsides, Tansy: today open 09:45 to 14:15, dew shuts it before, wind after; tomorrow tight 09:45 to 14:15, rain shuts it after; Friday shut: wind.'
		);
	});
});

describe('a reading', () => {
	const facts = (changes: Partial<ReadingFacts> = {}): ReadingFacts => ({
		slotStart: '2026-05-13T13:45:00Z',
		timeZone,
		state: 'tight',
		limiter: 'wind',
		binding: { value: '17.5 kn', bound: '20.0 kn', room: '2.5 kn', usualError: '2.6 kn' },
		missing: [],
		bindsAt: null,
		...changes
	});
	const CASES: [string, ReadingFacts, string, string][] = [
		[
			'tight',
			facts(),
			'Wed 14:45, tight: 2.5 kn of room',
			'17.5 kn against 20.0 kn; the usual error is 2.6 kn.'
		],
		[
			'shut later',
			facts({ state: 'shut', limiter: 'dew', bindsAt: '2026-05-13T20:00:00Z' }),
			'Wed 14:45, shut by dew',
			'17.5 kn against 20.0 kn at Wed 21:00, while the coat is not through; the usual error is 2.6 kn.'
		],
		[
			'missing',
			facts({ state: 'shut', limiter: 'noData', missing: ['dew point', 'wind'] }),
			'Wed 14:45, shut: no dew point and wind',
			'Nothing is guessed: a missing value keeps the hour shut.'
		],
		[
			'past the end',
			facts({ state: 'shut', limiter: 'noData' }),
			'Wed 14:45, shut: the forecast ends before it is dry',
			'Nothing is guessed: a missing value keeps the hour shut.'
		],
		[
			'closed',
			facts({ state: 'shut', limiter: 'hours', binding: null }),
			'Wed 14:45, shut by the yard’s hours',
			'The yard is closed then.'
		],
		[
			'dark',
			facts({ state: 'shut', limiter: 'dark', binding: null }),
			'Wed 14:45, shut by darkness',
			'There is no daylight over the whole quarter-hour.'
		],
		[
			'short',
			facts({ state: 'shut', limiter: 'short', binding: null }),
			'Wed 14:45, shut by too short a gap',
			'Too few quarter-hours in a row to finish the step.'
		],
		[
			'in or out',
			facts({ state: 'shut', limiter: 'rain', binding: null }),
			'Wed 14:45, shut by rain',
			'It is shut by rain.'
		],
		[
			'open all round',
			facts({ state: 'open', limiter: 'none', binding: null }),
			'Wed 14:45, open',
			'Every limit holds with room to spare.'
		]
	];
	test.each(CASES)('%s', (_, input, title, detail) => {
		expect(readingTitle(input)).toBe(title);
		expect(readingDetail(input)).toBe(detail);
	});
});

describe('words', () => {
	test('lists and counts read as said', () => {
		expect(list(['a', 'b', 'c'])).toBe('a, b and c');
		expect(list(['a'])).toBe('a');
		expect(counted(1, 'step')).toBe('1 step');
		expect(counted(3, 'step')).toBe('3 steps');
	});
});

describe('while the hours are being found', () => {
	test('the sentence counts the steps', () => {
		expect(text(finding(12).headline)).toBe('Finding the hours of 12 steps.');
		expect(text(finding(1).headline)).toBe('Finding the hours of 1 step.');
	});

	test('no state is told', () => {
		expect(text(finding(3).subline)).not.toMatch(/open|tight|shut/);
	});
});
