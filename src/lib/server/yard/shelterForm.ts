import { z } from 'zod';
import { shelterStockSchema, type ShelterStock } from '../../api/yard/shelters';
import { typedNumber } from '../http/form';
import { rowsOf, type SettingsReading } from './settingsForm';

const COUNT = 'Type how many there are, from 1 to 200.';
const rowSchema = z.object({
	kind: shelterStockSchema.shape.kind,
	name: shelterStockSchema.shape.name,
	count: typedNumber(1, 200, COUNT).pipe(z.int(COUNT))
});

/** The shelters a yard has; nothing stated where the form says so. */
export function readShelters(form: FormData): SettingsReading {
	if (form.get('stated') === 'unknown') return { patch: { shelters: null } };
	const errors: Record<string, string> = {};
	const shelters = rowsOf(form, 'shelter', ['name', 'count', 'kind'])
		.filter(({ row }) => row.name !== '' || row.count !== '')
		.flatMap(({ index, row }): ShelterStock[] => {
			const parsed = rowSchema.safeParse(row);
			if (parsed.success) return [parsed.data];
			for (const { path, message } of parsed.error.issues)
				errors[`shelter-${index}-${String(path[0])}`] ??= message;
			return [];
		});
	return Object.keys(errors).length > 0 ? { errors } : { patch: { shelters } };
}
