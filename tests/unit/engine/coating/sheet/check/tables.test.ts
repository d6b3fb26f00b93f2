import { describe, expect, test } from 'vitest';
import fc from 'fast-check';
import { minutesAt } from '../../../../../../src/lib/engine/coating/curve';
import { checkSheet } from '../../../../../../src/lib/engine/coating/sheet/check/readSheet';
import { findingSentence } from '../../../../../../src/lib/engine/coating/sheet/check/sentence';
import type { Sheet } from '../../../../../../src/lib/engine/coating/sheet/sheet';
import { tables } from './arbitraries';

const SHEET: Sheet = {
	name: 'Dunlin topcoat',
	type: 'onePartEnamel',
	sample: false,
	hazards: [],
	limits: {},
	times: { touchDry: 300, overcoatMin: 1080, overcoatMax: 4320 }
};
const withTimes = (times: Sheet['times']): Sheet => ({
	...SHEET,
	times: { ...SHEET.times, ...times }
});
const problemsOf = (sheet: Sheet): string[] => checkSheet(sheet).problems.map(findingSentence);
const warningsOf = (sheet: Sheet): string[] => checkSheet(sheet).warnings.map(findingSentence);

test('a sheet in order says nothing', () => {
	expect(checkSheet(SHEET)).toEqual({ problems: [], warnings: [] });
});

describe('a window that closes before it opens', () => {
	test('is refused with the row of the maximum', () => {
		expect(
			problemsOf(
				withTimes({
					overcoatMin: [
						[10, 960],
						[20, 480]
					],
					overcoatMax: [
						[10, 4000],
						[20, 400]
					]
				})
			)
		).toEqual([
			'Dunlin topcoat, overcoat max, row 2: at 20 °C, the maximum, 6.667 h, is under the minimum, 8 h.'
		]);
	});

	test('is found between the rows of the maximum too', () => {
		const sheet = withTimes({
			overcoatMin: [
				[5, 2000],
				[15, 1900],
				[25, 300]
			],
			overcoatMax: [
				[5, 4000],
				[25, 310]
			]
		});
		const { problems } = checkSheet(sheet);
		expect(problems).toMatchObject([
			{ code: 'maximumUnderMinimum', celsius: 15, row: null, against: expect.closeTo(1900, 6) }
		]);
	});

	test('is refused toward one following coating alone', () => {
		const sheet: Sheet = {
			...SHEET,
			following: { varnish: { overcoatMax: 600 }, onePartEnamel: { overcoatMin: 720 } }
		};
		expect(problemsOf(sheet)).toEqual([
			'Dunlin topcoat, overcoat max before varnish: the maximum, 10 h, is under the minimum, 18 h.'
		]);
	});

	test('is refused where the pair’s minimum passes the sheet’s maximum', () => {
		const sheet: Sheet = { ...SHEET, following: { varnish: { overcoatMin: 5000 } } };
		expect(problemsOf(sheet)).toEqual([
			'Dunlin topcoat, overcoat min before varnish: the maximum, 3 days, is under the minimum, 3.472 days.'
		]);
	});

	test('is refused between cure to launch and longest ashore', () => {
		expect(problemsOf(withTimes({ launchMin: 7200, launchMax: 2880 }))).toEqual([
			'Dunlin topcoat, launch max: the maximum, 2 days, is under the minimum, 5 days.'
		]);
	});

	test('is none where the tin sets no limit', () => {
		expect(problemsOf(withTimes({ overcoatMax: null }))).toEqual([]);
		expect(problemsOf(withTimes({ overcoatMin: null }))).toEqual([]);
	});

	test('is refused exactly when some temperature of both tables shows it', () => {
		fc.assert(
			fc.property(tables, tables, (overcoatMin, overcoatMax) => {
				const from = Math.max(overcoatMin[0][0], overcoatMax[0][0]);
				const to = Math.min(
					overcoatMin[overcoatMin.length - 1][0],
					overcoatMax[overcoatMax.length - 1][0]
				);
				let isClosed = false;
				for (let i = 0; i <= 200 && from <= to; i++) {
					const celsius = from + ((to - from) * i) / 200;
					const most = minutesAt(overcoatMax, celsius, 'latest');
					if (most < minutesAt(overcoatMin, celsius, 'latest') * (1 - 1e-6)) isClosed = true;
				}
				const { problems } = checkSheet({ ...SHEET, times: { overcoatMin, overcoatMax } });
				const isUnits = problems.some((it) => it.code !== 'maximumUnderMinimum');
				if (isClosed && !isUnits) expect(problems).toHaveLength(1);
				// Dense sampling may miss a crossing at a row by its step, never the other way about.
				if (problems.length === 0) expect(isClosed).toBe(false);
			}),
			{ numRuns: 300 }
		);
	});
});

describe('induction', () => {
	test('that outlasts the pot leaves nothing to lay', () => {
		expect(
			problemsOf({
				...SHEET,
				times: {
					...SHEET.times,
					potLife: [
						[10, 240],
						[30, 30]
					],
					induction: 40
				}
			})
		).toEqual([
			'Dunlin topcoat, induction: at 30 °C, 40 min leaves nothing of the pot life of 30 min.'
		]);
	});

	test('that is shorter is fine', () => {
		expect(problemsOf(withTimes({ potLife: 240, induction: 30 }))).toEqual([]);
	});
});

describe('warnings', () => {
	test('a time that lengthens as it warms', () => {
		expect(
			warningsOf(
				withTimes({
					touchDry: [
						[10, 300],
						[20, 320]
					]
				})
			)
		).toEqual([
			'Dunlin topcoat, touch dry, row 2: 5.333 h is longer than 5 h in the cooler row before.'
		]);
	});

	test('silence on what a plan needs, named each', () => {
		const sheet: Sheet = { ...SHEET, times: {} };
		expect(warningsOf(sheet)).toEqual([
			'Dunlin topcoat, touch dry: the sheet is silent, and a plan needs it.',
			'Dunlin topcoat, overcoat min: the sheet is silent, and a plan needs it.',
			'Dunlin topcoat, overcoat max: the sheet is silent, and a plan needs it.'
		]);
	});

	test('“no limit” is not silence', () => {
		expect(warningsOf(withTimes({ overcoatMax: null }))).toEqual([]);
	});

	test('a maximum per following coating is not silence', () => {
		const sheet: Sheet = {
			...SHEET,
			times: { touchDry: 300, overcoatMin: 600 },
			following: { onePartEnamel: { overcoatMax: 4320 } }
		};
		expect(warningsOf(sheet)).toEqual([]);
	});

	test('two parts need a pot life', () => {
		const parts = [
			{ name: 'base', share: 3 },
			{ name: 'hardener', share: 1 }
		];
		expect(warningsOf({ ...SHEET, mix: { by: 'volume', parts } })).toEqual([
			'Dunlin topcoat, pot life: the sheet is silent, and a plan needs it.'
		]);
		expect(warningsOf({ ...SHEET, mix: { by: 'volume', parts: parts.slice(0, 1) } })).toEqual([]);
	});

	test('a coat kept from rain needs a drying time, either of the two', () => {
		const dry: Sheet = {
			...SHEET,
			type: 'gelcoat',
			limits: { rainFree: true },
			times: { potLife: 20 }
		};
		expect(warningsOf(dry)).toEqual([
			'Dunlin topcoat, touch dry: the sheet is silent, and a plan needs it.'
		]);
		expect(warningsOf({ ...dry, times: { potLife: 20, keepDry: 240 } })).toEqual([]);
	});

	test('an antifouling needs to know when it may go into the water', () => {
		const sheet: Sheet = { ...SHEET, type: 'hardAntifouling' };
		expect(checkSheet(sheet).warnings).toMatchObject([
			{ code: 'silent', path: ['times', 'launchMin'] }
		]);
	});

	test('dust free after touch dry', () => {
		expect(warningsOf(withTimes({ dustFree: 400 }))).toEqual([
			'Dunlin topcoat, dust free: 6.667 h comes after 5 h, which should be later.'
		]);
	});

	test('a minimum and a maximum that share no temperature', () => {
		expect(
			checkSheet(
				withTimes({
					overcoatMin: [
						[5, 900],
						[15, 600]
					],
					overcoatMax: [
						[20, 3000],
						[30, 2000]
					]
				})
			).warnings
		).toMatchObject([{ code: 'rowsDoNotMeet', path: ['times', 'overcoatMax'] }]);
	});
});
