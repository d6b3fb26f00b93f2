import { z } from 'zod';
import { yardSettingsSchema } from '../../api/yard/settings';
import { timeZoneAt } from '../access/timeZone';
import { readFields, typedCoordinate, typedNumber } from '../http/form';
import type { SettingsReading } from './settingsForm';

const placeForm = z.object({
	name: yardSettingsSchema.shape.name,
	latitude: typedCoordinate('latitude'),
	longitude: typedCoordinate('longitude'),
	elevation: typedNumber(-450, 6000, 'Type metres above the sea, like 3.'),
	timeZone: z.string(),
	roughness: typedNumber(0.0001, 2, 'Choose what lies round the yard.'),
	albedo: typedNumber(0, 1, 'Choose what the ground is of.')
});

/** The place of a form; a zone left to the place follows the coordinates. */
export function readPlace(form: FormData): SettingsReading {
	const { data, trouble } = readFields(form, placeForm);
	if (trouble !== null) return { errors: trouble.errors };
	const timeZone = data.timeZone === '' ? timeZoneAt(data.latitude, data.longitude) : data.timeZone;
	return { patch: { ...data, timeZone } };
}
