import { holidaySchema } from '../../api/yard/holidays';
import { toWorkHours, WEEKDAY_WORDS, WEEKDAYS, type DaySpan } from '../../api/yard/week';
import { readTimeOfDay } from '../../time/timeOfDay';
import { rowsOf, type SettingsReading } from './settingsForm';

/** The hours of a week as a form holds them: `name-day-span-from` and `-to`. */
export function readWeek(
	form: FormData,
	name: string
): DaySpan[][] | { readonly errors: Record<string, string> } {
	const errors: Record<string, string> = {};
	const week = WEEKDAYS.map((day) =>
		rowsOf(form, `${name}-${day}`, ['from', 'to']).flatMap(({ index, row }): DaySpan[] => {
			const [from, to] = [readTimeOfDay(row.from), readTimeOfDay(row.to)];
			const field = `${name}-${day}-${index}`;
			const of = WEEKDAY_WORDS[day - 1];
			if (from === null) errors[`${field}-from`] = `${of}: type when it begins, like 07:30.`;
			if (to === null) errors[`${field}-to`] = `${of}: type when it ends, like 18:00.`;
			return from === null || to === null ? [] : [{ from, to }];
		})
	);
	return Object.keys(errors).length === 0 ? week : { errors };
}

/** Working or quiet hours of a form. */
export function readHours(name: 'workHours' | 'quietHours') {
	return (form: FormData): SettingsReading => {
		const week = readWeek(form, name);
		return 'errors' in week ? week : { patch: { [name]: toWorkHours(week) } };
	};
}

/** The holidays of a form, in order. */
export function readHolidays(form: FormData): SettingsReading {
	const errors: Record<string, string> = {};
	const holidays = rowsOf(form, 'holiday', ['date', 'name']).flatMap(({ index, row }) => {
		const parsed = holidaySchema.safeParse(row);
		if (parsed.success) return [parsed.data];
		for (const { path, message } of parsed.error.issues)
			errors[`holiday-${index}-${String(path[0])}`] ??= message;
		return [];
	});
	const seen = new Set<string>();
	rowsOf(form, 'holiday', ['date', 'name']).forEach(({ index, row }) => {
		if (seen.has(row.date)) errors[`holiday-${index}-date`] ??= 'This date is named twice.';
		seen.add(row.date);
	});
	if (Object.keys(errors).length > 0) return { errors };
	return { patch: { holidays: holidays.sort((a, b) => a.date.localeCompare(b.date)) } };
}
