import { describe, expect, test } from 'vitest';
import { DEMO_BOATS, type DemoStep } from '../../../../drizzle/seed/demo';
import { limitsSchema, SAMPLE_SHEETS, taskOf, timesSchema } from '../../../../src/lib/engine';
import { stepRules } from '../../../../src/lib/server/jobs/stepRules';

const stepOf = (change: Partial<DemoStep>): DemoStep => ({
	name: 'coat',
	kind: 'coat',
	method: 'roller',
	hours: 1,
	faces: [0],
	...change
});

describe('stepRules', () => {
	test('a coat has the wind of its method and nothing else of its sheet', () => {
		expect(stepRules([stepOf({ sheet: 'epoxyPrimer' })], 0)).toEqual({
			limits: { wind: { max: 9 }, gust: { max: 12 } },
			times: {}
		});
	});

	test('toward the coat that follows on its face it has that pair’s window', () => {
		const steps = [
			stepOf({ sheet: 'epoxyBarrier' }),
			stepOf({ sheet: 'varnish', faces: [1] }),
			stepOf({ sheet: 'erodingAntifouling' })
		];
		const pair = SAMPLE_SHEETS.epoxyBarrier.following?.erodingAntifouling;
		expect(stepRules(steps, 0).times).toEqual({
			overcoatMin: pair?.overcoatMin,
			overcoatMax: pair?.overcoatMax
		});
		expect(stepRules(steps, 2).times).toEqual({});
	});

	test('toward a coat that its sheet names no pair for, the sheet’s own window is left', () => {
		const steps = [stepOf({ sheet: 'varnish' }), stepOf({ sheet: 'varnish' })];
		expect(stepRules(steps, 0).times).toEqual({});
	});

	test('work without a sheet has the rule of its task, its own limits over it', () => {
		const step = stepOf({ kind: 'wash', task: 'pressureWash', limits: { daylight: false } });
		expect(stepRules([step], 0).limits).toEqual({
			...taskOf('pressureWash')?.limits,
			daylight: false
		});
	});

	test('every step of the demo is valid and has a sheet or a rule', () => {
		for (const boat of DEMO_BOATS)
			for (const { steps } of boat.jobs)
				steps.forEach((step, order) => {
					const { limits, times } = stepRules(steps, order);
					expect(limitsSchema.safeParse(limits).error).toBeUndefined();
					expect(timesSchema.safeParse(times).error).toBeUndefined();
					expect(step.sheet ?? step.task).toBeDefined();
				});
	});
});
