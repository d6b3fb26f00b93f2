import { fail } from '@sveltejs/kit';
import { jobEditSchema, orderSchema, stepMoveSchema } from '$lib/api/jobs';
import { answerPlanSchema, takePlanSchema } from '$lib/api/plans';
import { mayDo } from '$lib/server/access/roles';
import { refusal } from '$lib/server/http/outcome';
import { jobAt, signedInOrAway } from '$lib/server/jobs/jobAddress';
import { changeJob, orderSteps } from '$lib/server/jobs/jobEdit';
import { jobsBeside, jobView } from '$lib/server/jobs/jobView';
import { moveStep } from '$lib/server/jobs/stepState';
import { movesOfView } from '$lib/server/jobs/stepMoves';
import { jobPlans } from '$lib/server/plans/jobPlans';
import { answerPlan, letGo, takePlan } from '$lib/server/plans/takePlan';
import { instantOfLocal } from '$lib/time/dates';
import { z } from 'zod';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params }) => {
	signedInOrAway(locals);
	const { db, membership, job, boat } = await jobAt(locals, params, 'see');
	const now = new Date();
	const [view, beside, plans] = await Promise.all([
		jobView(db, membership, job.id),
		jobsBeside(db, boat.id, job.id),
		jobPlans(db, membership, job.id, now)
	]);
	if (view === null || plans === null) throw new Error('The job was there a moment ago.');
	return {
		job: view,
		steps: view.steps.map((step) => ({ ...step, moves: movesOfView(step, membership.role) })),
		beside,
		plans,
		currency: membership.yard.currency,
		me: membership.user.id,
		may: {
			edit: mayDo(membership.role, 'queueWork'),
			takePlan: mayDo(membership.role, 'takePlan')
		}
	};
};

const textOf = (form: FormData, name: string): string => String(form.get(name) ?? '').trim();
const wrong = (message: string, errors: Record<string, string> = {}) =>
	fail(400, { values: {}, errors, message, revision: null });
const settled = { values: {}, errors: {} as Record<string, string>, message: '', revision: null };

/** A moment chosen in a form, in the yard's zone; absent where none was. */
function momentOf(form: FormData, timeZone: string): { at?: string } | null {
	const typed = textOf(form, 'at');
	if (typed === '') return {};
	const instant = instantOfLocal(timeZone, typed);
	return instant === null ? null : { at: instant.toISOString() };
}

export const actions: Actions = {
	change: async ({ locals, params, request }) => {
		const { db, membership, job } = await jobAt(locals, params, 'queueWork');
		const form = await request.formData();
		const values = { name: textOf(form, 'name') };
		const asked = jobEditSchema.safeParse({
			revision: Number(textOf(form, 'revision')),
			name: values.name,
			waitsFor: form.getAll('waitsFor').map(String)
		});
		if (!asked.success) {
			const [{ path, message }] = asked.error.issues;
			return fail(400, {
				values,
				errors: { [String(path[0])]: message },
				message: '',
				revision: null
			});
		}
		const outcome = await changeJob(db, membership, job.id, asked.data);
		return outcome.outcome === 'done' ? settled : refusal(outcome, values);
	},
	order: async ({ locals, params, request }) => {
		const { db, membership, job } = await jobAt(locals, params, 'queueWork');
		const form = await request.formData();
		const asked = orderSchema.safeParse({
			revision: Number(textOf(form, 'revision')),
			order: textOf(form, 'order').split(',')
		});
		if (!asked.success) return wrong('That is no order of these steps.');
		const outcome = await orderSteps(db, membership, job.id, asked.data);
		return outcome.outcome === 'done' ? settled : refusal(outcome, {});
	},
	move: async ({ locals, params, request }) => {
		const { db, membership } = await jobAt(locals, params, 'queueWork');
		const form = await request.formData();
		const moment = momentOf(form, membership.yard.timeZone);
		if (moment === null) return wrong('Type a date and a time, or leave it empty for now.');
		const id = z.uuid().safeParse(textOf(form, 'step'));
		const asked = stepMoveSchema.safeParse({
			revision: Number(textOf(form, 'revision')),
			to: textOf(form, 'to'),
			...moment
		});
		if (!id.success || !asked.success) return wrong('Choose a step and what becomes of it.');
		const outcome = await moveStep(db, membership, id.data, asked.data, new Date());
		if (outcome.outcome === 'done') return settled;
		// The screen has one place for what is wrong with a move: over the steps.
		return outcome.outcome === 'refused' ? wrong(outcome.why) : refusal(outcome, {});
	},
	take: async ({ locals, params, request }) => {
		const { db, membership, job } = await jobAt(locals, params, 'takePlan');
		const form = await request.formData();
		const asked = takePlanSchema.safeParse({
			aim: textOf(form, 'aim'),
			starts: textOf(form, 'starts').split(',')
		});
		if (!asked.success) return wrong('Choose one of the plans.');
		const outcome = await takePlan(db, membership, job.id, asked.data, new Date());
		return outcome.outcome === 'done' ? settled : refusal(outcome, {});
	},
	letGo: async ({ locals, params }) => {
		const { db, membership, job } = await jobAt(locals, params, 'takePlan');
		await letGo(db, membership, job.id, new Date());
		return settled;
	},
	answer: async ({ locals, params, request }) => {
		const { db, membership, job } = await jobAt(locals, params, 'see');
		const form = await request.formData();
		const asked = answerPlanSchema.safeParse({
			stepId: textOf(form, 'step'),
			answer: textOf(form, 'answer'),
			reason: textOf(form, 'reason')
		});
		if (!asked.success) return wrong(asked.error.issues[0].message);
		const outcome = await answerPlan(db, membership, job.id, asked.data, new Date());
		return outcome.outcome === 'done' ? settled : refusal(outcome, {});
	}
};
