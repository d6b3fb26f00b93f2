import { z } from 'zod';
import { FEWEST_DAYS, MOST_DAYS, PROVIDER_NAMES } from '../../api/yard/settings';
import { readFields, typedNumber } from '../http/form';
import type { SettingsReading } from './settingsForm';

const DAYS = `Type whole days, from ${FEWEST_DAYS} to ${MOST_DAYS}.`;
const sourceForm = z.object({
	forecastProvider: z.enum(PROVIDER_NAMES),
	daysAhead: typedNumber(FEWEST_DAYS, MOST_DAYS, DAYS).pipe(z.int(DAYS))
});

/** The provider of first choice and the days on the Hours page. */
export function readSource(form: FormData): SettingsReading {
	const { data, trouble } = readFields(form, sourceForm);
	return trouble === null ? { patch: data } : { errors: trouble.errors };
}

/** A key as providers give them: letters, digits and a few signs. */
export const keyForm = z.object({
	key: z
		.string()
		.trim()
		.regex(/^[\x21-\x7e]{8,200}$/, 'Paste the key as the provider gave it, 8 to 200 characters.')
});
