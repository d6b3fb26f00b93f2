import { z } from 'zod';
import type { LooseSand } from '../../engine';
import type { SpeedUnit } from '../../units/speed';
import type { Yard } from '../db/schema';
import { readFields, typedNumber, typedSpeed } from '../http/form';
import { rowsOf, type SettingsReading } from './settingsForm';

/** Gusts a hoist or a yard can stop at, m/s. */
const LEAST_GUST = 3;
const MOST_GUST = 40;
export const typedGust = (unit: SpeedUnit, kept: number | null) =>
	typedSpeed(unit, LEAST_GUST, MOST_GUST, kept);

/** The yard's two gusts, in the person's unit. */
export function readGusts(
	form: FormData,
	yard: Pick<Yard, 'liftGust' | 'highWindGust'>,
	unit: SpeedUnit
): SettingsReading {
	const { data, trouble } = readFields(
		form,
		z.object({
			liftGust: typedGust(unit, yard.liftGust),
			highWindGust: typedGust(unit, yard.highWindGust)
		})
	);
	return trouble === null ? { patch: data } : { errors: trouble.errors };
}

const grainForm = z.object({
	grainDiameter: typedNumber(0.05, 2, 'Type the grains’ diameter in mm, from 0.05 to 2.'),
	clayPercent: typedNumber(0, 60, 'Type the share of clay in per cent, from 0 to 60.')
});
const angle = typedNumber(0, 360, 'Type degrees from north, 0 to 360.');
const sectorForm = z.object({ from: angle, to: angle });

/** Where loose sand comes from; "unknown" where nobody has said, "none" where there is none. */
export function readSand(form: FormData): SettingsReading {
	const stated = String(form.get('stated') ?? '');
	if (stated === 'unknown') return { patch: { looseSand: null } };
	const { data: grain, trouble } = readFields(form, grainForm);
	if (trouble !== null) return { errors: trouble.errors };
	if (stated === 'none') return { patch: { looseSand: { sectors: [], ...grain } } };
	const errors: Record<string, string> = {};
	const sectors: LooseSand['sectors'] = rowsOf(form, 'sector', ['from', 'to']).flatMap(
		({ index, row }) => {
			const parsed = sectorForm.safeParse(row);
			if (parsed.success && parsed.data.from !== parsed.data.to) return [parsed.data];
			if (parsed.success)
				errors[`sector-${index}-to`] = 'A sector needs two different ends, clockwise.';
			else
				for (const { path, message } of parsed.error.issues)
					errors[`sector-${index}-${String(path[0])}`] ??= message;
			return [];
		}
	);
	if (Object.keys(errors).length > 0) return { errors };
	if (sectors.length === 0)
		return { errors: { stated: 'Draw or type a sector, or say that there is no loose sand.' } };
	return { patch: { looseSand: { sectors, ...grain } } };
}
