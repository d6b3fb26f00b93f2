import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { latestFinishFor, nextBounds } from '../../../../../src/lib/engine/outlook/plan/inverse';
import { launchReadyAfter } from '../../../../../src/lib/engine/outlook/plan/launchReady';
import type { Step } from '../../../../../src/lib/engine/outlook/hours/step';
import { days, ensembleOf } from '../changingWeather';
import { forecastOf } from '../flatWeather';
import { coat, on, outlookOf } from '../job/jobs';

const planStepOf = (step: Step, forecast = forecastOf({}, 121)) =>
	outlookOf([on(step)], {}, { forecast }).steps[0].planStep;

describe('from a finish to the next coat', () => {
	test('constant times are those hours on, the latest on the first of both strokes', () => {
		const step = planStepOf(coat({ overcoatMin: 6, overcoatMax: 30 }));
		expect(nextBounds(step, { start: 40, finish: 48 })).toEqual({ earliest: 72, latest: 160 });
		// Longer at work than it is long: the last stroke binds.
		expect(nextBounds(step, { start: 40, finish: 44 })).toEqual({ earliest: 68, latest: 156 });
	});

	test('a tin that sets no limit, and one that is silent, give none', () => {
		const free = planStepOf(coat({ overcoatMin: null, overcoatMax: null }));
		expect(nextBounds(free, { start: 40, finish: 48 })).toEqual({
			earliest: Infinity,
			latest: Infinity
		});
	});
});

describe('the latest finish that still makes a launch', () => {
	test('is so many hours before it at a constant time', () => {
		const step = planStepOf(coat({ launchMin: 24 }));
		expect(latestFinishFor(step, 300)).toBeCloseTo(300 - 96, 3);
	});

	test('is none where the whole forecast is too short', () => {
		expect(latestFinishFor(planStepOf(coat({ launchMin: 100 })), 300)).toBeNull();
	});

	test('is ready at the launch, and a slot later is not', () => {
		const table: Step['times'] = {
			launchMin: [
				[5, 6000],
				[25, 900]
			]
		};
		fc.assert(
			fc.property(days, fc.integer({ min: 150, max: 470 }), (it, launch) => {
				const step = planStepOf({ ...coat({}), times: table }, ensembleOf(it, []));
				const finish = latestFinishFor(step, launch);
				if (finish === null) return;
				const ready = launchReadyAfter(
					step.step,
					step.faces,
					Float64Array.of(finish, finish + 1),
					'shaded'
				);
				expect(ready[0]).toBeLessThanOrEqual(launch + 1e-6);
				expect(ready[1]).toBeGreaterThan(launch);
			}),
			{ numRuns: 60 }
		);
	});
});
