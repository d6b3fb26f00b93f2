import { z } from 'zod';
import { METHODS, SHELTERS, STEP_KINDS, TASKS, WET_STEP_KINDS } from '../engine';

const instant = z.iso.datetime({ offset: true });
/** The count of changes that the asker had before them. */
const revision = z.int().min(1);
export const STEP_STATES = ['queued', 'underWay', 'curing', 'done', 'dropped'] as const;
export type StepState = (typeof STEP_STATES)[number];

/** Names of the rules of work without a sheet. */
const TASK_CODES = TASKS.map(({ code }) => code);

const HOURS_SENTENCE = 'Type how many hours the work takes, from 0.25 to 336.';

/** What a person says of a step of a job. */
export const stepEditSchema = z
	.object({
		name: z.string().trim().min(1, 'Give the step a name.').max(80, 'Use at most 80 characters.'),
		kind: z.enum(STEP_KINDS, { error: 'Choose what kind of work it is.' }),
		method: z.enum(METHODS, { error: 'Choose how it is laid.' }),
		/** Of work, whole crew. */
		hours: z.number({ error: HOURS_SENTENCE }).min(0.25, HOURS_SENTENCE).max(336, HOURS_SENTENCE),
		sheetId: z.uuid({ error: 'Choose a sheet of this yard.' }).nullable(),
		task: z.enum(TASK_CODES, { error: 'Choose one of the usual rules of work.' }).nullable(),
		shelter: z.enum(SHELTERS, { error: 'Choose what stands over it.' }),
		faceIds: z.array(z.uuid()).min(1, 'Choose at least one face.').max(40),
		painterIds: z.array(z.uuid()).max(20, 'Name at most 20 people.'),
		/** A start fixed by hand; null lets the plans choose. */
		pinnedAt: instant.nullable()
	})
	.refine(({ kind, sheetId }) => !WET_STEP_KINDS.includes(kind) || sheetId !== null, {
		path: ['sheetId'],
		error: 'Choose the sheet of what is laid: without one nothing says when its hours are shut.'
	})
	.refine(({ kind, method }) => kind !== 'coat' || method !== 'none', {
		path: ['method'],
		error: 'Choose how the coat is laid: its wind limits go by that.'
	});
export type StepEdit = z.infer<typeof stepEditSchema>;

export const newJobSchema = z
	.object({
		/** A usual job, laid with all its steps. */
		template: z.string().nullish(),
		/** Or an empty job of this name. */
		name: z.string().trim().min(1, 'Give the job a name.').max(80).nullish()
	})
	.refine(({ template, name }) => (template == null) !== (name == null), {
		error: 'Give either a usual job or a name for an empty one.'
	});

export const jobEditSchema = z.object({
	revision,
	name: z.string().trim().min(1, 'Give the job a name.').max(80, 'Use at most 80 characters.'),
	/** Jobs of the same boat that are done before this one begins. */
	waitsFor: z.array(z.uuid()).max(20)
});
export type JobEdit = z.infer<typeof jobEditSchema>;

/** Everything in its new order, and the state that order was made from. */
export const orderSchema = z.object({ revision, order: z.array(z.uuid()).min(1).max(500) });

export const stepMoveSchema = z.object({
	revision,
	to: z.enum(STEP_STATES),
	/** When it began or ended; absent: now. */
	at: instant.optional()
});
export type StepMove = z.infer<typeof stepMoveSchema>;

export const stepChangeSchema = z.object({ revision, step: stepEditSchema });

const named = z.object({ id: z.string(), name: z.string() });

export const jobStepSchema = z.object({
	id: z.string(),
	revision: z.int(),
	name: z.string(),
	kind: z.enum(STEP_KINDS),
	method: z.enum(METHODS),
	hours: z.number(),
	state: z.enum(STEP_STATES),
	sheet: named.extend({ version: z.int(), sample: z.boolean() }).nullable(),
	task: z.enum(TASK_CODES).nullable(),
	shelter: z.enum(SHELTERS),
	faces: z.array(named),
	painters: z.array(named),
	pinnedAt: z.iso.datetime().nullable(),
	startedAt: z.iso.datetime().nullable(),
	finishedAt: z.iso.datetime().nullable(),
	/** The usual caution of this kind of work; null where none is needed. */
	caution: z.string().nullable()
});
export type JobStepView = z.infer<typeof jobStepSchema>;

/** A job of a boat, its steps in order. */
export const jobSchema = z.object({
	id: z.string(),
	revision: z.int(),
	name: z.string(),
	boat: named.extend({ stand: z.string().nullable(), launchBy: z.iso.date().nullable() }),
	waitsFor: z.array(named),
	steps: z.array(jobStepSchema)
});
export type JobView = z.infer<typeof jobSchema>;

/** The jobs of a boat, in order. */
export const jobNamesSchema = z.object({
	jobs: z.array(named.extend({ revision: z.int() }))
});
