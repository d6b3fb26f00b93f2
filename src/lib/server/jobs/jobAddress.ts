import { error, redirect } from '@sveltejs/kit';
import { eq } from 'drizzle-orm';
import { z } from 'zod';
import { mayDo, requireMembership, type Permission } from '../access/roles';
import { parts } from '../composition';
import { steps } from '../db/schema';
import { visibleJob } from './jobView';

/** The membership and the job of an address; a job one may not see is none. */
export async function jobAt(
	locals: App.Locals,
	params: { yard: string; job: string },
	permission: Permission
) {
	const { db } = parts();
	const membership = await requireMembership(db, locals, params.yard);
	const id = z.uuid().safeParse(params.job);
	const found = id.success ? await visibleJob(db, membership, id.data) : null;
	if (found === null) error(404, 'There is no such job, or it is not yours to see.');
	if (!mayDo(membership.role, permission))
		error(403, 'Your role in this yard does not allow that.');
	return { db, membership, ...found };
}

/** The membership and the job of a step's address; a step of a boat one may not see is none. */
export async function stepAt(
	locals: App.Locals,
	params: { yard: string; step: string },
	permission: Permission
) {
	const { db } = parts();
	const membership = await requireMembership(db, locals, params.yard);
	const id = z.uuid().safeParse(params.step);
	const [step] = id.success
		? await db.select({ jobId: steps.jobId }).from(steps).where(eq(steps.id, id.data))
		: [];
	const found = step === undefined ? null : await visibleJob(db, membership, step.jobId);
	if (found === null) error(404, 'There is no such step, or it is not yours to see.');
	if (!mayDo(membership.role, permission))
		error(403, 'Your role in this yard does not allow that.');
	return { db, membership, stepId: params.step, ...found };
}

/** Sends who is not signed in to sign in; a page's load begins with it. */
export function signedInOrAway(locals: App.Locals): void {
	if (locals.user === null) redirect(303, '/sign-in');
}
