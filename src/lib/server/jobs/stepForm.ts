import { stepEditSchema, type StepEdit } from '../../api/jobs';
import { instantOfLocal } from '../../time/dates';

/** What was typed into a step's form, as typed. */
export interface StepFormValues {
	readonly name: string;
	readonly kind: string;
	readonly method: string;
	readonly hours: string;
	readonly sheetId: string;
	readonly task: string;
	readonly shelter: string;
	readonly faceIds: readonly string[];
	readonly painterIds: readonly string[];
	/** Local date and time in the yard's zone. */
	readonly pinnedAt: string;
}

type Read =
	| { readonly edit: StepEdit; readonly values: StepFormValues; readonly errors: null }
	| {
			readonly edit: null;
			readonly values: StepFormValues;
			readonly errors: Record<string, string>;
	  };

const orNull = (text: string): string | null => (text === '' ? null : text);

/** A step as a form says it; times are read in the yard's zone. */
export function readStepForm(form: FormData, timeZone: string): Read {
	const text = (name: string): string => String(form.get(name) ?? '').trim();
	const all = (name: string): string[] => form.getAll(name).map(String);
	const values: StepFormValues = {
		name: text('name'),
		kind: text('kind'),
		method: text('method'),
		hours: text('hours'),
		sheetId: text('sheetId'),
		task: text('task'),
		shelter: text('shelter'),
		faceIds: all('faceIds'),
		painterIds: all('painterIds'),
		pinnedAt: text('pinnedAt')
	};
	const pinned = values.pinnedAt === '' ? null : instantOfLocal(timeZone, values.pinnedAt);
	const parsed = stepEditSchema.safeParse({
		...values,
		hours: values.hours === '' ? NaN : Number(values.hours.replace(',', '.')),
		sheetId: orNull(values.sheetId),
		task: orNull(values.task),
		pinnedAt: values.pinnedAt === '' ? null : (pinned?.toISOString() ?? 'none')
	});
	if (parsed.success) return { edit: parsed.data, values, errors: null };
	const errors: Record<string, string> = {};
	for (const { path, message } of parsed.error.issues) {
		const field = String(path[0]);
		errors[field] ??= field === 'pinnedAt' ? 'Type a date and a time, or leave it empty.' : message;
	}
	return { edit: null, values, errors };
}
