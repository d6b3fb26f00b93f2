import type { FormPart } from './formPart';

export interface ListRow<Field extends string> {
	readonly index: number;
	readonly row: Readonly<Record<Field, string>>;
	/** The empty one at the end. */
	readonly isNew: boolean;
}

/** The rows a list's form shows: what was typed and not saved, else what is kept, and an empty one. */
export function listRows<Field extends string>(
	{ typed }: FormPart,
	name: string,
	fields: readonly Field[],
	kept: readonly Readonly<Record<Field, string>>[]
): ListRow<Field>[] {
	const count =
		typed === null
			? kept.length + 1
			: Math.max(
					kept.length + 1,
					...Object.keys(typed).map((key) => {
						const found = key.startsWith(`${name}-`)
							? /^(\d+)-/.exec(key.slice(name.length + 1))
							: null;
						return found === null ? 0 : Number(found[1]) + 1;
					})
				);
	return Array.from({ length: count }, (_, index) => {
		const of = (field: Field): string =>
			typed?.[`${name}-${index}-${field}`] ?? kept[index]?.[field] ?? '';
		const row = Object.fromEntries(fields.map((field) => [field, of(field)]));
		return { index, row: row as Record<Field, string>, isNew: index === count - 1 };
	});
}
