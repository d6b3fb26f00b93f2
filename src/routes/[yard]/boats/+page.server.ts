import { fail, redirect } from '@sveltejs/kit';
import { z } from 'zod';
import { mayDo, requireMembership } from '$lib/server/access/roles';
import { boatsQuerySchema } from '$lib/api/lists/boats';
import { addBoat, newBoatSchema, ownersOf } from '$lib/server/boats/boats';
import { COLOURS, HULLS } from '$lib/server/boats/hulls';
import { parts } from '$lib/server/composition';
import { readForm, typedNumber } from '$lib/server/http/form';
import { asPage, readListQuery } from '$lib/server/http/list';
import { boatList } from '$lib/server/lists/boats';
import type { Actions, PageServerLoad } from './$types';

const { name, stand, hull, colour } = newBoatSchema.shape;
const boatForm = z.object({
	name,
	stand,
	heading: typedNumber(0, 360, 'Type where the bow points, degrees from 0 (north) to 360.'),
	hull,
	colour,
	owner: z.string()
});

export const load: PageServerLoad = async ({ locals, params, url }) => {
	if (locals.user === null) redirect(303, '/sign-in');
	const { db } = parts();
	const membership = await requireMembership(db, locals, params.yard);
	const page = await asPage(async () =>
		boatList.page(db, membership, readListQuery(url, boatsQuerySchema))
	);
	const isManager = membership.role === 'manager';
	return {
		boats: page.items,
		next: page.next,
		mayAdd: mayDo(membership.role, 'addBoat'),
		owners: isManager ? await ownersOf(db, membership) : null,
		hulls: [...HULLS],
		colours: Object.keys(COLOURS)
	};
};

export const actions: Actions = {
	default: async ({ locals, params, request }) => {
		const { db } = parts();
		const membership = await requireMembership(db, locals, params.yard, 'addBoat');
		const read = await readForm(request, boatForm);
		if (read.trouble !== null) return fail(400, { ...read.trouble, message: '' });
		const { owner, ...boat } = read.data;
		const id = await addBoat(db, membership, { ...boat, ownerId: owner === '' ? null : owner });
		if (id === null)
			return fail(400, {
				values: read.values,
				errors: {},
				message: 'That person is no owner of this yard.'
			});
		redirect(303, `/${params.yard}/boats/${id}`);
	}
};
