import { z } from 'zod';
import { readCoordinate, type CoordinateAxis } from '../../units/coordinates';
import { rounded } from '../../units/rounding';
import { fromSpeed, toSpeed, type SpeedUnit } from '../../units/speed';

/** What was typed into a form, to be shown again, and what is wrong with it by field. */
export interface FormTrouble<Name extends string> {
	readonly values: Record<string, string>;
	readonly errors: Partial<Record<Name, string>>;
}

type Read<Shape extends z.ZodObject> =
	| {
			readonly data: z.infer<Shape>;
			readonly trouble: null;
			readonly values: Record<string, string>;
	  }
	| { readonly data: null; readonly trouble: FormTrouble<Extract<keyof z.infer<Shape>, string>> };

/** Fields that are never shown again. */
const SECRET = /passphrase|key/i;

/**
 * The fields of a posted form by a schema: its data, or what was typed and the first thing wrong
 * with each field. Passphrases and keys are never sent back.
 */
export async function readForm<Shape extends z.ZodObject>(
	request: Request,
	schema: Shape
): Promise<Read<Shape>> {
	return readFields(await request.formData(), schema);
}

/** The same of a form that has been read. */
export function readFields<Shape extends z.ZodObject>(form: FormData, schema: Shape): Read<Shape> {
	const given = Object.fromEntries(
		Object.keys(schema.shape).map((name) => [name, String(form.get(name) ?? '')])
	);
	const values = typedValues(form, Object.keys(schema.shape));
	const parsed = schema.safeParse(given);
	if (parsed.success) return { data: parsed.data, trouble: null, values };
	const errors: Record<string, string> = {};
	for (const { path, message } of parsed.error.issues) errors[String(path[0])] ??= message;
	return { data: null, trouble: { values, errors } };
}

/** What was typed into fields of a form, to be shown again. */
export function typedValues(form: FormData, names: Iterable<string>): Record<string, string> {
	return Object.fromEntries(
		[...names].map((name) => [name, SECRET.test(name) ? '' : String(form.get(name) ?? '')])
	);
}

/** A number as a person types it: "37.02", "37,02". */
export const typedNumber = (least: number, most: number, sentence: string) =>
	z
		.string()
		.trim()
		.transform((text) => (text === '' ? NaN : Number(text.replace(',', '.'))))
		.pipe(z.number({ error: sentence }).min(least, sentence).max(most, sentence));

/** A coordinate as a person types it, in degrees. */
export const typedCoordinate = (axis: CoordinateAxis) =>
	z.string().transform((typed, context) => {
		const { degrees, trouble } = readCoordinate(typed, axis);
		if (trouble === null) return degrees;
		context.addIssue({ code: 'custom', message: trouble });
		return z.NEVER;
	});

/**
 * A wind in a person's unit, in m/s.
 *
 * @param least - and most, m/s
 * @param kept - the wind there is, m/s: typed as it is shown, it stays what it is to the last digit
 */
export const typedSpeed = (
	unit: SpeedUnit,
	least: number,
	most: number,
	kept: number | null = null
) => {
	const whole = (speed: number): string => String(Math.round(toSpeed(speed, unit)));
	const sentence = `Type a wind in ${unit}, from ${whole(least)} to ${whole(most)}.`;
	const shown = kept === null ? null : Number(rounded(toSpeed(kept, unit), 1));
	return typedNumber(0, Infinity, sentence)
		.transform((value) => (value === shown && kept !== null ? kept : fromSpeed(value, unit)))
		.refine((speed) => speed >= least && speed <= most, { error: sentence });
};
