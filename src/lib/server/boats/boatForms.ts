import { z } from 'zod';
import { boatSettingsSchema, faceSettingsSchema, type FaceSettings } from '../../api/boat';
import { readFields, typedNumber } from '../http/form';
import { COLOURS, type Colour } from './hulls';

const revision = z.coerce.number().pipe(z.int().min(1));
const DATE = 'Type the date as year-month-day, like 2026-05-25, or leave it empty.';
const typedDate = z
	.literal('')
	.transform(() => null)
	.or(z.iso.date({ error: DATE }));
const orNobody = z
	.literal('')
	.transform(() => null)
	.or(z.uuid());

/** A boat's own form; what a member may not say is not in it. */
export const boatForm = z.object({
	revision,
	name: boatSettingsSchema.shape.name,
	hauledOn: typedDate,
	launchBy: typedDate
});
export const managersForm = boatForm.extend({
	ownerId: orNobody,
	standId: orNobody,
	heading: typedNumber(0, 360, 'Type where the bow points, degrees from 0 (north) to 360.')
});

const { name, side, material, finish } = faceSettingsSchema.shape;
const AREA = 'Type square metres, like 12.5, or leave it empty.';
const faceForm = z.object({
	name,
	side,
	material,
	finish,
	/** A colour, or the numbers as they are. */
	colour: z.string(),
	area: z
		.literal('')
		.transform(() => null)
		.or(typedNumber(0.01, 5_000, AREA))
});
const isColour = (typed: string): typed is Colour => Object.hasOwn(COLOURS, typed);

type Coat = Pick<FaceSettings, 'solarAbsorptance' | 'emissivity'>;

/** The colour whose numbers a face has; null where they are its own. */
export const colourOf = ({ solarAbsorptance, emissivity }: Coat): Colour | null =>
	(Object.keys(COLOURS) as Colour[]).find(
		(it) =>
			COLOURS[it].solarAbsorptance === solarAbsorptance && COLOURS[it].emissivity === emissivity
	) ?? null;

/** A face of a form; `kept` are the numbers of its present coat where no colour is named. */
export function readFace(form: FormData, kept: Coat) {
	const { data, trouble, ...rest } = readFields(form, faceForm);
	if (trouble !== null) return { face: null, errors: trouble.errors, ...rest };
	const { colour, ...face } = data;
	const { solarAbsorptance, emissivity } = isColour(colour) ? COLOURS[colour] : kept;
	return { face: { ...face, solarAbsorptance, emissivity }, errors: {}, ...rest };
}

/** The id and revision of the row a form is about. */
export const rowForm = z.object({ id: z.uuid(), revision });
