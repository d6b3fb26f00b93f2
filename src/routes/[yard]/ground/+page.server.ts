import { fail, redirect } from '@sveltejs/kit';
import { mayDo, requireMembership } from '$lib/server/access/roles';
import { parts } from '$lib/server/composition';
import {
	moveForm,
	newStandForm,
	readLee,
	readPlan,
	standForm
} from '$lib/server/ground/groundForms';
import { boatsOnGround, moveBoat } from '$lib/server/ground/moveBoat';
import { addStand, changeStand, removeStand, standsOf } from '$lib/server/ground/stands';
import { readFields, typedValues } from '$lib/server/http/form';
import { yardDocument } from '$lib/server/yard/changeYard';
import { answerOf, saveSettings } from '$lib/server/yard/settingsForm';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params }) => {
	if (locals.user === null) redirect(303, '/sign-in');
	const { db } = parts();
	const membership = await requireMembership(db, locals, params.yard);
	return {
		plan: yardDocument(membership.yard),
		stands: await standsOf(db, membership),
		boats: await boatsOnGround(db, membership),
		mayChange: mayDo(membership.role, 'changeYard')
	};
};

export const actions: Actions = {
	plan: (event) => saveSettings(event, 'plan', readPlan),
	add: async ({ locals, params, request }) => {
		const { db } = parts();
		const membership = await requireMembership(db, locals, params.yard, 'changeYard');
		const form = await request.formData();
		const read = readFields(form, newStandForm);
		const answer = { ...answerOf('add'), values: typedValues(form, form.keys()) };
		if (read.trouble !== null)
			return fail(400, { ...answer, errors: read.trouble.errors, saved: false });
		const { groundWidth, groundDepth } = membership.yard;
		const added = await addStand(db, membership, {
			...read.data,
			x: groundWidth / 2,
			y: groundDepth / 2
		});
		if ('why' in added) return fail(409, { ...answer, errors: { name: added.why }, saved: false });
		redirect(303, `/${params.yard}/ground?stand=${added.id}`);
	},
	stand: async ({ locals, params, request }) => {
		const { db } = parts();
		const membership = await requireMembership(db, locals, params.yard, 'changeYard');
		const form = await request.formData();
		const answer = answerOf(`stand ${String(form.get('id') ?? '')}`);
		const no = (status: number, more: Partial<typeof answer>) =>
			fail(status, { ...answer, values: typedValues(form, form.keys()), saved: false, ...more });
		const read = readFields(form, standForm);
		if (read.trouble !== null) return no(400, { errors: read.trouble.errors });
		const { id, revision, ...values } = read.data;
		if (form.has('remove') && form.get('remove') === 'stand') {
			const result = await removeStand(db, membership, id, revision, form.has('settled'));
			if (result.outcome === 'changed') redirect(303, `/${params.yard}/ground`);
			if (result.outcome === 'asks') return no(409, { message: result.why, asks: true });
			return no(
				409,
				'why' in result ? { message: result.why } : { message: 'It is gone already.' }
			);
		}
		const { lee, errors } = readLee(form);
		if (Object.keys(errors).length > 0) return no(400, { errors });
		const result = await changeStand(db, membership, id, { ...values, lee, revision });
		switch (result.outcome) {
			case 'changed':
				return answer;
			case 'stale':
				return no(409, { message: result.why, revision: result.revision });
			case 'refused':
				return no(409, { errors: { name: result.why } });
			case 'gone':
				return no(404, { message: 'That stand is gone: load the page again.' });
		}
	},
	move: async ({ locals, params, request }) => {
		const { db } = parts();
		const membership = await requireMembership(db, locals, params.yard, 'changeYard');
		const form = await request.formData();
		const answer = answerOf(`boat ${String(form.get('id') ?? '')}`);
		const no = (status: number, more: Partial<typeof answer>) =>
			fail(status, { ...answer, values: typedValues(form, form.keys()), saved: false, ...more });
		const read = readFields(form, moveForm);
		if (read.trouble !== null) return no(400, { errors: read.trouble.errors });
		const { id, ...move } = read.data;
		const result = await moveBoat(db, membership, id, move);
		switch (result.outcome) {
			case 'changed':
				return answer;
			case 'stale':
				return no(409, { message: result.why, revision: result.revision });
			case 'refused':
				return no(409, { message: result.why });
			case 'gone':
				return no(404, { message: 'That boat is gone: load the page again.' });
		}
	}
};
