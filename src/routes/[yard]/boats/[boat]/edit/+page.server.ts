import { fail, redirect } from '@sveltejs/kit';
import { mayDo } from '$lib/server/access/roles';
import { boatForm, colourOf, managersForm, readFace, rowForm } from '$lib/server/boats/boatForms';
import {
	boatDocument,
	changeBoat,
	peopleWithRole,
	removeBoat,
	type BoatResult
} from '$lib/server/boats/editBoat';
import { addFace, changeFace, removeFace } from '$lib/server/boats/editFace';
import { COLOURS } from '$lib/server/boats/hulls';
import { requireBoat } from '$lib/server/boats/requireBoat';
import { parts } from '$lib/server/composition';
import { standsOf } from '$lib/server/ground/stands';
import { readFields, typedValues } from '$lib/server/http/form';
import { faceWords } from '$lib/server/outlook/engineInput';
import { answerOf, type SettingsAnswer } from '$lib/server/yard/settingsForm';
import type { Actions, PageServerLoad, RequestEvent } from './$types';

const boatAt = ({ locals, params }: Pick<RequestEvent, 'locals' | 'params'>) =>
	requireBoat(parts().db, locals, params.yard, params.boat, 'changeBoat');

export const load: PageServerLoad = async ({ locals, params }) => {
	if (locals.user === null) redirect(303, '/sign-in');
	const { db } = parts();
	const { membership, boat } = await boatAt({ locals, params });
	const isManager = mayDo(membership.role, 'changeYard');
	const whole = await boatDocument(db, membership, boat.id);
	if (whole === null) redirect(303, `/${params.yard}/boats`);
	return {
		boat: {
			...whole,
			faces: whole.faces.map((face) => ({
				...face,
				words: faceWords(face),
				colour: colourOf(face)
			}))
		},
		owners: isManager ? await peopleWithRole(db, membership, 'owner') : null,
		painters: await peopleWithRole(db, membership, 'painter'),
		stands: isManager ? await standsOf(db, membership) : null,
		colours: Object.keys(COLOURS)
	};
};

/** What a form is told of what became of its change. */
function tell(result: BoatResult, form: FormData, part: string) {
	const answer = answerOf(part);
	const no = (status: number, more: Partial<SettingsAnswer>) =>
		fail(status, { ...answer, values: typedValues(form, form.keys()), saved: false, ...more });
	switch (result.outcome) {
		case 'changed':
			return answer;
		case 'stale':
			return no(409, { message: result.why, revision: result.revision });
		case 'asks':
			return no(409, { message: result.why, asks: true });
		case 'refused':
			return result.field === null
				? no(409, { message: result.why })
				: no(409, { errors: { [result.field]: result.why } });
		case 'gone':
			return no(404, { message: 'It is gone already: load the page again.' });
	}
}

function wrong(errors: SettingsAnswer['errors'], form: FormData, part: string) {
	const values = typedValues(form, form.keys());
	return fail(400, { ...answerOf(part), values, errors, saved: false });
}

export const actions: Actions = {
	boat: async (event) => {
		const { membership, boat } = await boatAt(event);
		const form = await event.request.formData();
		const isManager = mayDo(membership.role, 'changeYard');
		const read = readFields(form, isManager ? managersForm : boatForm);
		if (read.trouble !== null) return wrong(read.trouble.errors, form, 'boat');
		return tell(await changeBoat(parts().db, membership, boat.id, read.data), form, 'boat');
	},
	painters: async (event) => {
		const { membership, boat } = await boatAt(event);
		const form = await event.request.formData();
		const read = readFields(form, boatForm.pick({ revision: true }));
		if (read.trouble !== null) return wrong(read.trouble.errors, form, 'painters');
		const painterIds = form.getAll('painter').map(String);
		const patch = { painterIds, revision: read.data.revision };
		return tell(await changeBoat(parts().db, membership, boat.id, patch), form, 'painters');
	},
	addFace: async (event) => {
		const { boat } = await boatAt(event);
		const form = await event.request.formData();
		const { face, errors } = readFace(form, COLOURS.white);
		if (face === null) return wrong(errors, form, 'face new');
		const added = await addFace(parts().db, boat.id, face);
		return 'why' in added
			? tell({ outcome: 'refused', field: null, why: added.why }, form, 'face new')
			: answerOf('face new');
	},
	face: async (event) => {
		const { boat } = await boatAt(event);
		const { db } = parts();
		const form = await event.request.formData();
		const row = readFields(form, rowForm);
		if (row.trouble !== null) return wrong(row.trouble.errors, form, 'face');
		const { id, revision } = row.data;
		const part = `face ${id}`;
		if (form.get('remove') === 'face')
			return tell(await removeFace(db, boat.id, id, revision, form.has('settled')), form, part);
		const kept = boat.faces.find((it) => it.id === id);
		if (kept === undefined) return tell({ outcome: 'gone' }, form, part);
		const { face, errors } = readFace(form, kept);
		if (face === null) return wrong(errors, form, part);
		return tell(await changeFace(db, boat.id, id, { ...face, revision }), form, part);
	},
	remove: async (event) => {
		const { membership, boat } = await boatAt(event);
		const form = await event.request.formData();
		const read = readFields(form, boatForm.pick({ revision: true }));
		if (read.trouble !== null) return wrong(read.trouble.errors, form, 'remove');
		const settled = form.has('settled');
		const result = await removeBoat(parts().db, membership, boat.id, read.data.revision, settled);
		if (result.outcome === 'changed') redirect(303, `/${event.params.yard}/boats`);
		return tell(result, form, 'remove');
	}
};
