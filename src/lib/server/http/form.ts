import { z } from 'zod';

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
const SECRET = /passphrase/i;

/**
 * The fields of a posted form by a schema: its data, or what was typed and the first thing wrong
 * with each field. Passphrases are never sent back.
 */
export async function readForm<Shape extends z.ZodObject>(
	request: Request,
	schema: Shape
): Promise<Read<Shape>> {
	const form = await request.formData();
	const given = Object.fromEntries(
		Object.keys(schema.shape).map((name) => [name, String(form.get(name) ?? '')])
	);
	const values = Object.fromEntries(
		Object.entries(given).map(([name, value]) => [name, SECRET.test(name) ? '' : value])
	);
	const parsed = schema.safeParse(given);
	if (parsed.success) return { data: parsed.data, trouble: null, values };
	const errors: Record<string, string> = {};
	for (const { path, message } of parsed.error.issues) errors[String(path[0])] ??= message;
	return { data: null, trouble: { values, errors } };
}

/** A number as a person types it: "37.02", "37,02". */
export const typedNumber = (least: number, most: number, sentence: string) =>
	z
		.string()
		.trim()
		.transform((text) => (text === '' ? NaN : Number(text.replace(',', '.'))))
		.pipe(z.number({ error: sentence }).min(least, sentence).max(most, sentence));
