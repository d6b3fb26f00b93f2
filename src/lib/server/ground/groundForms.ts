import { z } from 'zod';
import { newStandSchema, standSettingsSchema } from '../../api/yard/stands';
import type { LeeSector } from '../../engine';
import { readFields, typedNumber } from '../http/form';
import { rowsOf, type SettingsReading } from '../yard/settingsForm';

const metres = (least: number) => typedNumber(least, 3_000, `Type metres, from ${least} to 3000.`);
const revision = z.coerce.number().pipe(z.int().min(1));

export const planForm = z.object({
	groundWidth: metres(10),
	groundDepth: metres(10),
	groundBearing: typedNumber(0, 360, 'Type degrees from north, 0 to 360.')
});

/** The plan's size and which way its upper edge looks. */
export function readPlan(form: FormData): SettingsReading {
	const { data, trouble } = readFields(form, planForm);
	if (trouble !== null) return { errors: trouble.errors };
	return { patch: { ...data, groundBearing: data.groundBearing % 360 } };
}

export const newStandForm = z.object({ name: newStandSchema.shape.name });

export const standForm = z.object({
	id: z.uuid(),
	revision,
	name: standSettingsSchema.shape.name,
	x: metres(0),
	y: metres(0)
});

export const moveForm = z.object({
	id: z.uuid(),
	revision,
	standId: z.union([z.literal('').transform(() => null), z.uuid()]),
	heading: typedNumber(0, 360, 'Type where the bow points, degrees from 0 (north) to 360.')
});

const angle = typedNumber(0, 360, 'Type degrees, 0 to 360.');
const leeRow = z
	.object({
		from: angle,
		to: angle,
		left: typedNumber(0, 100, 'Type per cent of the wind, 0 to 100.'),
		height: z
			.literal('')
			.transform(() => undefined)
			.or(typedNumber(0.5, 60, 'Type metres, 0.5 to 60, or nothing.'))
	})
	.refine(({ from, to }) => from !== to, {
		error: 'A sector needs two different ends.',
		path: ['to']
	});

/** Lee sectors of a stand's form; what is wrong by field. */
export function readLee(form: FormData): { lee: LeeSector[]; errors: Record<string, string> } {
	const errors: Record<string, string> = {};
	const lee = rowsOf(form, 'lee', ['from', 'to', 'left', 'height']).flatMap(({ index, row }) => {
		const parsed = leeRow.safeParse(row);
		if (parsed.success) {
			const { from, to, left, height } = parsed.data;
			return [{ from, to, factor: left / 100, ...(height === undefined ? {} : { height }) }];
		}
		for (const { path, message } of parsed.error.issues)
			errors[`lee-${index}-${String(path[0])}`] ??= message;
		return [];
	});
	return { lee, errors };
}
