import { fail, type ActionFailure, type RequestEvent } from '@sveltejs/kit';
import { z } from 'zod';
import { yardSettingsSchema, type YardPatch } from '../../api/yard/settings';
import { requireMembership, type Membership } from '../access/roles';
import { parts } from '../composition';
import { typedValues } from '../http/form';
import { changeYard } from './changeYard';

/** What a form of the settings is told: what was typed, what is wrong, and who came first. */
export interface SettingsAnswer {
	/** The form of the page that was sent. */
	readonly part: string;
	readonly values: Record<string, string>;
	readonly errors: Partial<Record<string, string>>;
	readonly message: string;
	/** To save on next; null: the one the page was drawn with. */
	readonly revision: number | null;
	readonly saved: boolean;
	/** Whether the message is the one question before something is taken away. */
	readonly asks?: boolean;
}

/** A form's answer where all went well. */
export const answerOf = (part: string): SettingsAnswer => ({
	part,
	values: {},
	errors: {},
	message: '',
	revision: null,
	saved: true
});

/** Settings read from a form, or what is wrong by field. */
export type SettingsReading =
	| { readonly patch: Omit<YardPatch, 'revision'>; readonly errors?: undefined }
	| { readonly errors: Partial<Record<string, string>>; readonly patch?: undefined };

const partial = yardSettingsSchema.partial();
const revisionSchema = z.coerce.number().pipe(z.int().min(1));

/**
 * Saves one form of the settings. What was typed comes back with what is wrong; a page drawn before
 * somebody else's change is told who came first, with 409.
 *
 * @param part - the form of the page, as its answer names it
 * @param read - makes settings of the fields, as the yard stands now
 */
export async function saveSettings(
	{
		locals,
		params,
		request
	}: Pick<RequestEvent, 'locals' | 'request'> & { params: { yard: string } },
	part: string | ((form: FormData) => string),
	read: (form: FormData, membership: Membership) => SettingsReading
): Promise<SettingsAnswer | ActionFailure<SettingsAnswer>> {
	const { db } = parts();
	const membership = await requireMembership(db, locals, params.yard, 'changeYard');
	const form = await request.formData();
	const answer: SettingsAnswer = {
		part: typeof part === 'string' ? part : part(form),
		values: typedValues(form, new Set(form.keys())),
		errors: {},
		message: '',
		revision: null,
		saved: false
	};
	const revision = revisionSchema.safeParse(form.get('revision'));
	if (!revision.success)
		return fail(400, { ...answer, message: 'This form is incomplete: load the page again.' });
	const { patch, errors } = read(form, membership);
	if (errors !== undefined) return fail(400, { ...answer, errors });
	const checked = partial.safeParse(patch);
	if (!checked.success) {
		const [{ path, message }] = checked.error.issues;
		return fail(400, { ...answer, errors: { [String(path[0])]: message }, message });
	}
	const result = await changeYard(db, membership, { ...checked.data, revision: revision.data });
	switch (result.outcome) {
		case 'changed':
			return { ...answer, values: {}, saved: true };
		case 'stale':
			return fail(409, { ...answer, message: result.why, revision: result.revision });
		case 'busy':
			return fail(503, { ...answer, message: result.why });
		case 'gone':
			return fail(404, { ...answer, message: 'This yard is gone.' });
	}
}

/**
 * The rows of a list in a form, whose fields are named `name-0-field`; those left wholly empty and
 * the one taken away (`remove` holds its number) are left out.
 */
export function rowsOf<Field extends string>(
	form: FormData,
	name: string,
	fields: readonly Field[]
): { readonly index: number; readonly row: Record<Field, string> }[] {
	const removed = String(form.get('remove') ?? '');
	const indices = new Set(
		[...form.keys()].flatMap((key) => {
			const found = new RegExp(`^${name}-(\\d+)-`).exec(key);
			return found === null ? [] : [Number(found[1])];
		})
	);
	return [...indices]
		.sort((a, b) => a - b)
		.filter((index) => String(index) !== removed)
		.map((index) => {
			const entries = fields.map((field) => [
				field,
				String(form.get(`${name}-${index}-${field}`) ?? '').trim()
			]);
			return { index, row: Object.fromEntries(entries) as Record<Field, string> };
		})
		.filter(({ row }) => fields.some((field) => row[field] !== ''));
}
