import { describe, expect, test } from 'vitest';
import {
	COATING_TYPES,
	limitsSchema,
	SAMPLE_SHEETS,
	taskOf,
	TASKS,
	timesSchema
} from '../../../../src/lib/engine';
import { stepRules } from '../../../../src/lib/server/jobs/stepRules';

const STEP = { method: 'roller', task: null, limits: {}, times: {} } as const;

describe('stepRules', () => {
	test('a coat has its sheet’s limits, with the most wind of its method', () => {
		const sheet = SAMPLE_SHEETS.epoxyPrimer;
		const { limits } = stepRules({ ...STEP, method: 'airless' }, sheet, null);
		expect(limits.spread).toEqual(sheet.limits.spread);
		expect(limits.wind).toEqual({ max: 6.7 });
	});

	test('a coat’s overcoat times are those toward the very coat that follows', () => {
		const sheet = SAMPLE_SHEETS.epoxyBarrier;
		const pair = sheet.following?.erodingAntifouling;
		const { times } = stepRules(STEP, sheet, 'erodingAntifouling');
		expect(times.overcoatMin).toEqual(pair?.overcoatMin);
		expect(stepRules(STEP, sheet, 'epoxyBarrier').times).toEqual(sheet.times);
		expect(stepRules(STEP, sheet, null).times).toEqual(sheet.times);
	});

	test('what an edited sheet says is what its steps go by', () => {
		const edited = {
			...SAMPLE_SHEETS.epoxyPrimer,
			wind: { roller: { wind: 3, gust: 4 } },
			times: { ...SAMPLE_SHEETS.epoxyPrimer.times, touchDry: 500 }
		};
		const { limits, times } = stepRules(STEP, edited, null);
		expect(limits.wind).toEqual({ max: 3 });
		expect(times.touchDry).toBe(500);
	});

	test('work without a sheet goes by its rule, and a step’s own word stands over either', () => {
		const own = { daylight: false, wind: { max: 2 } };
		const { limits } = stepRules({ ...STEP, task: 'pressureWash', limits: own }, null, null);
		expect(limits).toEqual({ ...taskOf('pressureWash').limits, ...own });
		expect(stepRules({ ...STEP, limits: own }, SAMPLE_SHEETS.varnish, null).limits.wind).toEqual({
			max: 2
		});
	});

	test('whatever the sheet, task and next coat, the engine reads them', () => {
		for (const sheet of Object.values(SAMPLE_SHEETS))
			for (const next of [null, ...COATING_TYPES]) {
				const { limits, times } = stepRules(STEP, sheet, next);
				expect(limitsSchema.safeParse(limits).error).toBeUndefined();
				expect(timesSchema.safeParse(times).error).toBeUndefined();
			}
		for (const { code } of TASKS) {
			const { limits, times } = stepRules({ ...STEP, task: code }, null, null);
			expect(limitsSchema.safeParse(limits).error).toBeUndefined();
			expect(timesSchema.safeParse(times).error).toBeUndefined();
		}
	});
});
