import { fail, redirect } from '@sveltejs/kit';
import { z } from 'zod';
import {
	invitationSchema,
	invite,
	peopleOf,
	takeBackInvitation
} from '$lib/server/access/invitations';
import { mayDo, requireMembership, visibleBoats } from '$lib/server/access/roles';
import { parts } from '$lib/server/composition';
import { boatNames } from '$lib/server/db/boats';
import { readForm } from '$lib/server/http/form';
import { mailPause } from '$lib/server/http/mailLimit';
import type { Actions, PageServerLoad } from './$types';

const inviteForm = z.object({
	email: invitationSchema.shape.email,
	role: invitationSchema.shape.role,
	boat: z.string()
});

export const load: PageServerLoad = async ({ locals, params }) => {
	if (locals.user === null) redirect(303, '/sign-in');
	const { db } = parts();
	const membership = await requireMembership(db, locals, params.yard, 'invite');
	const seesAll = mayDo(membership.role, 'seePeople');
	return {
		people: seesAll ? await peopleOf(db, membership) : null,
		boats: await boatNames(db, visibleBoats(db, membership)),
		// An owner asks painters only.
		roles:
			membership.role === 'manager'
				? (['owner', 'painter', 'manager'] as const)
				: (['painter'] as const)
	};
};

export const actions: Actions = {
	invite: async ({ locals, params, request, getClientAddress }) => {
		const { db, config } = parts();
		const membership = await requireMembership(db, locals, params.yard, 'invite');
		const read = await readForm(request, inviteForm);
		if (read.trouble !== null) return fail(400, { ...read.trouble, message: '', sentTo: null });
		const { email, role, boat } = read.data;
		const { values } = read;
		const no = (status: number, message: string) =>
			fail(status, { values, errors: {}, message, sentTo: null });
		const minutes = await mailPause(db, getClientAddress(), email);
		if (minutes !== null)
			return no(429, `Too many letters. Wait ${minutes} minutes, then try again.`);
		const result = await invite(
			db,
			membership,
			{ email, role, boatId: boat === '' ? null : boat },
			config.ORIGIN
		);
		switch (result.outcome) {
			case 'notAllowed':
				return no(403, result.why);
			case 'belongs':
				return no(409, 'That person belongs to the yard already.');
			case 'invited':
				return { values: {}, errors: {}, message: '', sentTo: email };
		}
	},
	takeBack: async ({ locals, params, request }) => {
		const { db } = parts();
		const membership = await requireMembership(db, locals, params.yard, 'seePeople');
		const id = z.uuid().safeParse((await request.formData()).get('invitation'));
		if (id.success) await takeBackInvitation(db, membership, id.data);
		return { values: {}, errors: {}, message: '', sentTo: null };
	}
};
