import { describe, expect, test } from 'vitest';
import type { Step } from '../../../../../src/lib/engine/outlook/hours/step';
import { coat, on, outlookOf } from './jobs';

/** Chains as long as a request may be, of the shapes that make a planner slow. */
const LENGTH = 24;
const EVERY_DAY = [{ days: [1, 2, 3, 4, 5, 6, 7], from: '06:00', to: '21:00' }];
const chainOf = (make: (index: number) => Step) =>
	Array.from({ length: LENGTH }, (_, index) => on(make(index)));
const quick = (more: Partial<Step> = {}, times: Parameters<typeof coat>[0] = {}): Step =>
	coat(
		{ touchDry: 0.5, overcoatMin: 1, overcoatMax: 10, launchMin: 10, ...times },
		{ durationMinutes: 30, workHours: EVERY_DAY, ...more }
	);
/** More than ten times what they take; one exponential search takes minutes. */
const SOON = 5_000;

describe('a chain of the greatest length is planned in no more than seconds', () => {
	test(
		'a wash between all coats, every window reaching over one',
		() => {
			const wash = quick({ kind: 'wash', times: {} });
			const { plans } = outlookOf(chainOf((i) => (i % 2 === 1 ? wash : quick())));
			expect(plans.surest?.steps.filter(({ step }) => step !== null)).toHaveLength(LENGTH);
		},
		SOON
	);

	test(
		'every maximum missed: abrading before each coat but the first',
		() => {
			const late = quick({}, { overcoatMax: 0.5 });
			const { plans } = outlookOf(chainOf(() => late));
			expect(plans.soonest?.inserted).toBe(LENGTH - 1);
			expect(plans.surest?.inserted).toBe(LENGTH - 1);
		},
		SOON
	);

	test(
		'no room for it at all, whatever is abraded',
		() => {
			const long = quick({ durationMinutes: 600 }, { overcoatMax: 40 });
			const { plans, warnings } = outlookOf(chainOf(() => long));
			expect(plans.soonest).toBeNull();
			// Five days of one coat each.
			expect(warnings).toContainEqual({ code: 'nothingFits', step: 5, hasStarts: true });
		},
		SOON
	);

	test(
		'a launch that every coat holds back and hurries',
		() => {
			const launch = quick({ kind: 'launch', times: {} });
			const { plans } = outlookOf(
				chainOf((i) => (i === LENGTH - 1 ? launch : quick({}, { launchMax: 200 })))
			);
			expect(plans.surest?.steps).toHaveLength(LENGTH);
		},
		SOON
	);
});
