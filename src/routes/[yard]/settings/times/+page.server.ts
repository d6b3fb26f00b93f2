import { error, fail, redirect, type RequestEvent } from '@sveltejs/kit';
import { z } from 'zod';
import { toWorkHours } from '$lib/api/yard/week';
import { absenceSchema } from '$lib/api/workTimes';
import { mayDo, requireMembership } from '$lib/server/access/roles';
import { parts } from '$lib/server/composition';
import { typedValues } from '$lib/server/http/form';
import {
	absencesAhead,
	addAbsence,
	peopleWithTimes,
	personWithTimes,
	removeAbsence,
	setWorkHours
} from '$lib/server/people/workTimes';
import { readWeek } from '$lib/server/yard/hoursForm';
import { answerOf, type SettingsAnswer } from '$lib/server/yard/settingsForm';
import type { Actions, PageServerLoad } from './$types';

/** The membership and whose times the address is about: one's own without a name. */
async function timesAt({
	locals,
	params,
	url
}: Pick<RequestEvent, 'locals' | 'url'> & { params: { yard: string } }) {
	const { db } = parts();
	const membership = await requireMembership(db, locals, params.yard);
	const asked = url.searchParams.get('person') ?? membership.user.id;
	const id = z.uuid().safeParse(asked);
	const person = id.success ? await personWithTimes(db, membership, id.data) : null;
	if (person === null) error(404, 'There is nobody of that name whose hours are yours to say.');
	return { db, membership, person, yardId: membership.yard.id };
}

export const load: PageServerLoad = async (event) => {
	if (event.locals.user === null) redirect(303, '/sign-in');
	const { db, membership, person, yardId } = await timesAt(event);
	return {
		person,
		isOther: person.id !== membership.user.id,
		people: mayDo(membership.role, 'setTimes') ? await peopleWithTimes(db, membership) : [],
		absences: await absencesAhead(db, yardId, person.id)
	};
};

const unsaved = (part: string, form: FormData, errors: SettingsAnswer['errors']) =>
	fail(400, {
		...answerOf(part),
		values: typedValues(form, new Set(form.keys())),
		errors,
		saved: false
	});

export const actions: Actions = {
	hours: async (event) => {
		const { db, person, yardId } = await timesAt(event);
		const form = await event.request.formData();
		const week = readWeek(form, 'workHours');
		if ('errors' in week) return unsaved('hours', form, week.errors);
		await setWorkHours(db, yardId, person.id, toWorkHours(week));
		return answerOf('hours');
	},
	yardHours: async (event) => {
		const { db, person, yardId } = await timesAt(event);
		await setWorkHours(db, yardId, person.id, null);
		return answerOf('hours');
	},
	absence: async (event) => {
		const { db, person, yardId } = await timesAt(event);
		const form = await event.request.formData();
		const text = (name: string): string => String(form.get(name) ?? '').trim();
		const parsed = absenceSchema.safeParse({
			from: text('from'),
			to: text('to') === '' ? text('from') : text('to'),
			note: text('note')
		});
		if (!parsed.success) {
			const errors: Record<string, string> = {};
			for (const { path, message } of parsed.error.issues) errors[String(path[0])] ??= message;
			return unsaved('absence', form, errors);
		}
		await addAbsence(db, yardId, person.id, parsed.data);
		return answerOf('absence');
	},
	remove: async (event) => {
		const { db, person, yardId } = await timesAt(event);
		const id = z.uuid().safeParse((await event.request.formData()).get('absence'));
		if (id.success) await removeAbsence(db, yardId, person.id, id.data);
		return answerOf('absence');
	}
};
