import { describe, expect, test } from 'vitest';
import { SAMPLE_SHEETS, TASKS } from '../../../../src/lib/engine';
import { cautionOf } from '../../../../src/lib/server/outlook/cautions';

describe('cautionOf', () => {
	test('the worst of a sheet’s hazards is the one shown', () => {
		expect(cautionOf('coat', 'roller', ['solvent', 'isocyanate'])).toContain('Isocyanates');
		expect(cautionOf('coat', 'roller', ['solvent', 'epoxy'])).toContain('Epoxy sensitises');
	});

	test('spray mist comes before all but isocyanates', () => {
		expect(cautionOf('coat', 'airless', ['epoxy'])).toContain('Spray mist');
		expect(cautionOf('coat', 'hvlp', ['isocyanate'])).toContain('air-fed');
	});

	test('work without a sheet has the caution of its kind', () => {
		expect(cautionOf('abrade', 'none', [])).toContain('lead');
		expect(cautionOf('launch', 'none', [])).toContain('Nobody under the load');
		expect(cautionOf('fit', 'none', [])).toBeNull();
	});

	test('a hazard of another making is passed over', () => {
		expect(cautionOf('coat', 'brush', ['glitter'])).toBeNull();
	});

	test('every caution defers to sheets, yard and law', () => {
		const hazards = [
			...TASKS.flatMap((task) => task.hazards),
			...Object.values(SAMPLE_SHEETS).flatMap((sheet) => sheet.hazards)
		];
		expect(new Set(hazards).size).toBeGreaterThanOrEqual(12);
		for (const hazard of hazards)
			expect(cautionOf('coat', 'brush', [hazard])).toMatch(/law come first\.$/);
	});
});
