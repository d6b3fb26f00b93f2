/** What a page's action told, as one of its forms reads it. */
export interface ToldForm {
	readonly part: string;
	readonly values: Record<string, string>;
	readonly errors: Partial<Record<string, string>>;
	readonly message: string;
	readonly revision: number | null;
	readonly saved: boolean;
	readonly asks?: boolean;
}

/** One form of a page: what it shows in its fields, what is wrong, and what it saves on. */
export interface FormPart {
	readonly name: string;
	/** What was typed and not saved, else what is kept. */
	readonly value: (field: string, kept: string) => string;
	readonly error: (field: string) => string | undefined;
	readonly message: string;
	readonly saved: boolean;
	/** Whether the message is the one question before something is taken away. */
	readonly asks: boolean;
	readonly revision: number;
	/** What was typed and not saved; null where nothing is. */
	readonly typed: Record<string, string> | null;
}

/**
 * @param told - the page's `form`; it may be another form's
 * @param revision - the row's, as the page was drawn with it
 */
export function formPart(
	told: ToldForm | null | undefined,
	name: string,
	revision: number
): FormPart {
	const own = told?.part === name ? told : null;
	const typed = own === null || own.saved ? null : own.values;
	return {
		name,
		value: (field, kept) => typed?.[field] ?? kept,
		error: (field) => own?.errors[field],
		message: own?.message ?? '',
		saved: own?.saved ?? false,
		asks: own?.asks ?? false,
		// Told that another came first, the next save is a decision on what is there now.
		revision: Math.max(own?.revision ?? 0, revision),
		typed
	};
}
