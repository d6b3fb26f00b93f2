import { randomUUID } from 'node:crypto';
import { z } from 'zod';
import { hoistSchema, type Hoist, type LaunchSlots } from '../../api/yard/hoists';
import { WEEKDAYS } from '../../api/yard/week';
import { yardSettingsSchema, SLIP_UNITS } from '../../api/yard/settings';
import { readTimeOfDay } from '../../time/timeOfDay';
import type { SpeedUnit } from '../../units/speed';
import type { Yard } from '../db/schema';
import { readFields, typedNumber } from '../http/form';
import { rowsOf, type SettingsReading } from './settingsForm';
import { typedGust } from './windForm';

/** Times typed in a row: "09:00, 13:30"; null where one of them is none. */
function readTimes(typed: string): string[] | null {
	const times = typed
		.split(/[\s,;]+/)
		.filter((it) => it !== '')
		.map(readTimeOfDay);
	return times.length === 0 || times.includes(null)
		? null
		: times.filter((it) => it !== null).sort();
}

const TIMES_WANTED = 'Type times like 09:00, 13:30.';

function readWeekly(form: FormData, errors: Record<string, string>): LaunchSlots[] {
	return rowsOf(form, 'weekly', ['times']).flatMap(({ index, row }): LaunchSlots[] => {
		const days = WEEKDAYS.filter((day) => form.has(`weekly-${index}-day${day}`));
		const times = readTimes(row.times);
		if (times === null) errors[`weekly-${index}-times`] = TIMES_WANTED;
		else if (days.length === 0) errors[`weekly-${index}-times`] = 'Tick the days it lifts on.';
		else return [{ days, times, tide: false }];
		return [];
	});
}

function readDated(form: FormData, errors: Record<string, string>): LaunchSlots[] {
	return rowsOf(form, 'dated', ['date', 'times']).flatMap(({ index, row }): LaunchSlots[] => {
		const date = z.iso.date().safeParse(row.date);
		const times = readTimes(row.times);
		if (!date.success)
			errors[`dated-${index}-date`] = 'Type the date as year-month-day, like 2026-05-25.';
		if (times === null) errors[`dated-${index}-times`] = TIMES_WANTED;
		if (!date.success || times === null) return [];
		return [{ date: date.data, times, tide: form.has(`dated-${index}-tide`) }];
	});
}

/** A hoist of a form in place of the one it names, or as a new one; `remove` of "hoist" takes it away. */
export function readHoist(form: FormData, yard: Yard, unit: SpeedUnit): SettingsReading {
	const given = String(form.get('hoist') ?? '');
	const before = yard.hoists.find(({ id }) => id === given);
	const others = yard.hoists.filter(({ id }) => id !== given);
	if (form.get('remove') === 'hoist') return { patch: { hoists: others } };
	const errors: Record<string, string> = {};
	const gustTyped = String(form.get('gust') ?? '').trim();
	const gust =
		gustTyped === '' ? { data: null } : typedGust(unit, before?.gust ?? null).safeParse(gustTyped);
	if ('error' in gust && gust.error) errors.gust = gust.error.issues[0].message;
	const name = hoistSchema.shape.name.safeParse(form.get('name'));
	if (!name.success) errors.name = name.error.issues[0].message;
	const slots = [...readWeekly(form, errors), ...readDated(form, errors)];
	if (Object.keys(errors).length > 0 || !name.success) return { errors };
	const hoist: Hoist = {
		id: before?.id ?? randomUUID(),
		name: name.data,
		gust: gust.data ?? null,
		slots
	};
	return {
		patch: {
			hoists:
				before === undefined
					? [...others, hoist]
					: yard.hoists.map((it) => (it === before ? hoist : it))
		}
	};
}

const { currency } = yardSettingsSchema.shape;
const moneyForm = z.object({
	dayRate: z.string().trim(),
	currency: z.string().trim().toUpperCase().pipe(currency),
	slipFreeDays: typedNumber(0, 60, 'Type whole days, from 0 to 60.').pipe(
		z.int('Type whole days, from 0 to 60.')
	),
	slipPer: z.enum(SLIP_UNITS)
});
const rate = typedNumber(0, 1_000_000, 'Type money a day, like 34.50, or leave it empty.');

/** What a day ashore costs and how a slip is billed. */
export function readMoney(form: FormData): SettingsReading {
	const { data, trouble } = readFields(form, moneyForm);
	if (trouble !== null) return { errors: trouble.errors };
	if (data.dayRate === '') return { patch: { ...data, dayRate: null } };
	const dayRate = rate.safeParse(data.dayRate);
	if (!dayRate.success) return { errors: { dayRate: dayRate.error.issues[0].message } };
	return { patch: { ...data, dayRate: dayRate.data } };
}
