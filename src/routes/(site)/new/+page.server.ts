import { fail, redirect } from '@sveltejs/kit';
import { z } from 'zod';
import { timeZoneAt } from '$lib/server/access/timeZone';
import {
	askToFound,
	founderSchema,
	foundYard,
	yardPlaceSchema
} from '$lib/server/access/foundYard';
import { parts } from '$lib/server/composition';
import { readForm, typedCoordinate, typedNumber } from '$lib/server/http/form';
import { mailPause } from '$lib/server/http/mailLimit';
import type { Actions, PageServerLoad } from './$types';

const placeForm = z.object({
	yard: yardPlaceSchema.shape.name,
	latitude: typedCoordinate('latitude'),
	longitude: typedCoordinate('longitude'),
	elevation: typedNumber(-450, 6000, 'Type metres above the sea, like 3.')
});
const newcomerForm = placeForm.extend({ email: founderSchema.shape.email });

const placeOf = ({ yard, ...it }: z.infer<typeof placeForm>) => ({
	...it,
	name: yard,
	timeZone: timeZoneAt(it.latitude, it.longitude)
});

export const load: PageServerLoad = ({ locals }) => ({
	person: locals.user === null ? null : locals.user.name
});

export const actions: Actions = {
	default: async ({ request, locals, getClientAddress }) => {
		const { db, config } = parts();
		const { user } = locals;
		if (user !== null) {
			const { data, trouble } = await readForm(request, placeForm);
			if (trouble !== null) return fail(400, { ...trouble, message: '', sentTo: null });
			const slug = await foundYard(db, placeOf(data), user.id);
			redirect(303, `/${slug}`);
		}
		const read = await readForm(request, newcomerForm);
		if (read.trouble !== null) return fail(400, { ...read.trouble, message: '', sentTo: null });
		const { data, values } = read;
		const minutes = await mailPause(db, getClientAddress(), data.email);
		if (minutes !== null)
			return fail(429, {
				values,
				errors: {},
				message: `Too many letters from here. Wait ${minutes} minutes, then try again.`,
				sentTo: null
			});
		await askToFound(db, {
			place: placeOf(data),
			email: data.email,
			origin: config.ORIGIN
		});
		return { values, errors: {}, message: '', sentTo: data.email };
	}
};
