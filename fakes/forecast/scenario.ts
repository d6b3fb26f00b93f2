import { readFileSync } from 'node:fs';
import { z } from 'zod';
import { anchorAt, generator } from './generator';
import { readMeasured } from './measured';
import { replay } from './replay';
import type { Weather } from './weather';

const ensemble = {
	/** Members beside the control; GEFS has thirty. */
	members: z.int().min(1).max(50).default(30)
};

/** What weather the fake tells of. */
export const scenarioSchema = z.discriminatedUnion('kind', [
	z.strictObject({
		/** Made-up weather with a story from today on, seeded. */
		kind: z.literal('story'),
		timeZone: z.string().default('UTC'),
		/** Local date of the story's today; the fake's own today when left out. */
		anchor: z.iso.date().optional(),
		seed: z.int().default(1),
		climate: z.enum(['mild', 'seasonal']).default('mild'),
		...ensemble
	}),
	z.strictObject({
		/** Measured hours of a CSV file, at their own times or shifted by whole hours. */
		kind: z.literal('replay'),
		file: z.string(),
		shiftSeconds: z.int().multipleOf(3_600).default(0),
		seed: z.int().default(1),
		...ensemble
	})
]);
export type Scenario = z.input<typeof scenarioSchema>;

export interface Stage {
	weather: Weather;
	seed: number;
	members: number;
}

/**
 * The weather of a scenario.
 *
 * @param now - the fake's clock, UTC epoch seconds
 */
export function stage(scenario: Scenario, now: number): Stage {
	const parsed = scenarioSchema.parse(scenario);
	const { seed, members } = parsed;
	if (parsed.kind === 'replay') {
		const { hours } = readMeasured(readFileSync(parsed.file, 'utf8'));
		return { weather: replay(hours, parsed.shiftSeconds), seed, members };
	}
	const anchor = parsed.anchor ?? anchorAt(now, parsed.timeZone);
	return { weather: generator({ ...parsed, anchor }), seed, members };
}
