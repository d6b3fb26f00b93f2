import {
	jobEditSchema,
	jobNamesSchema,
	jobSchema,
	newJobSchema,
	orderSchema,
	stepChangeSchema,
	stepEditSchema,
	stepMoveSchema
} from '../jobs';
import { answerPlanSchema, jobPlansSchema, takePlanSchema } from '../plans';
import {
	answer,
	BOAT,
	body,
	parameter,
	problems,
	schemaOf,
	SIGNED_IN,
	SLUG,
	UUID,
	type Part
} from './parts';

const JOB = parameter('job', 'path', 'The job', UUID);
const STEP = parameter('step', 'path', 'The step', UUID);
const WRITES = [400, 401, 403, 404, 409, 413, 415];
const THE_JOB = answer('The job as it is now', 'Job');
const THE_PLANS = answer('The plans as they are now', 'JobPlans');
const JOBS = answer('The jobs, in order', 'JobNames');

/** Jobs of boats, their steps, and the plans for them. Writes carry the `revision` they were made from. */
export const jobsPart: Part = {
	paths: {
		'/yards/{slug}/boats/{boat}/jobs': {
			get: {
				operationId: 'jobsOfBoat',
				summary: 'The jobs of a boat, in order',
				security: SIGNED_IN,
				parameters: [SLUG, BOAT],
				responses: { 200: JOBS, ...problems(401, 404) }
			},
			post: {
				operationId: 'queueJob',
				summary: 'Queue a usual job with all its steps, or an empty one',
				security: SIGNED_IN,
				parameters: [SLUG, BOAT],
				requestBody: body('NewJob'),
				responses: { 201: answer('The new job', 'Job'), ...problems(...WRITES) }
			},
			put: {
				operationId: 'orderJobs',
				summary: 'Put the jobs of a boat in another order; `revision` is the boat’s',
				security: SIGNED_IN,
				parameters: [SLUG, BOAT],
				requestBody: body('Order'),
				responses: { 200: JOBS, ...problems(...WRITES) }
			}
		},
		'/yards/{slug}/jobs/{job}': {
			get: {
				operationId: 'job',
				summary: 'A job with its steps, in order',
				security: SIGNED_IN,
				parameters: [SLUG, JOB],
				responses: { 200: answer('The job', 'Job'), ...problems(401, 404) }
			},
			patch: {
				operationId: 'changeJob',
				summary: 'Rename a job and say which others of its boat come before it',
				security: SIGNED_IN,
				parameters: [SLUG, JOB],
				requestBody: body('JobEdit'),
				responses: { 200: THE_JOB, ...problems(...WRITES) }
			}
		},
		'/yards/{slug}/jobs/{job}/order': {
			put: {
				operationId: 'orderSteps',
				summary: 'Put the steps of a job in another order; what has begun stays in its place',
				security: SIGNED_IN,
				parameters: [SLUG, JOB],
				requestBody: body('Order'),
				responses: { 200: THE_JOB, ...problems(...WRITES) }
			}
		},
		'/yards/{slug}/jobs/{job}/steps': {
			post: {
				operationId: 'addStep',
				summary: 'Put a step at the end of a job',
				security: SIGNED_IN,
				parameters: [SLUG, JOB],
				requestBody: body('StepEdit'),
				responses: { 201: THE_JOB, ...problems(...WRITES) }
			}
		},
		'/yards/{slug}/steps/{step}': {
			put: {
				operationId: 'changeStep',
				summary: 'Say anew all that is said of a step',
				security: SIGNED_IN,
				parameters: [SLUG, STEP],
				requestBody: body('StepChange'),
				responses: { 200: THE_JOB, ...problems(...WRITES) }
			}
		},
		'/yards/{slug}/steps/{step}/state': {
			put: {
				operationId: 'moveStep',
				summary: 'Take a step from one state to another, with the time it was',
				security: SIGNED_IN,
				parameters: [SLUG, STEP],
				requestBody: body('StepMove'),
				responses: { 200: THE_JOB, ...problems(...WRITES) }
			}
		},
		'/yards/{slug}/jobs/{job}/plans': {
			get: {
				operationId: 'plansOfJob',
				summary: 'The plan in force and those that can be taken now',
				security: SIGNED_IN,
				parameters: [SLUG, JOB],
				responses: { 200: answer('The plans', 'JobPlans'), ...problems(401, 404) }
			},
			post: {
				operationId: 'takePlan',
				summary: 'Take a plan as it was shown; refused where the hours have changed since',
				security: SIGNED_IN,
				parameters: [SLUG, JOB],
				requestBody: body('TakePlan'),
				responses: { 201: THE_PLANS, ...problems(...WRITES) }
			},
			delete: {
				operationId: 'letPlanGo',
				summary: 'Let go of the plan in force',
				security: SIGNED_IN,
				parameters: [SLUG, JOB],
				responses: { 204: { description: 'No plan is in force' }, ...problems(401, 403, 404) }
			}
		},
		'/yards/{slug}/jobs/{job}/plan/answer': {
			put: {
				operationId: 'answerPlan',
				summary: 'Accept or decline one’s own step of the plan in force',
				security: SIGNED_IN,
				parameters: [SLUG, JOB],
				requestBody: body('PlanAnswer'),
				responses: { 200: THE_PLANS, ...problems(...WRITES) }
			}
		}
	},
	schemas: {
		NewJob: schemaOf(newJobSchema, 'input'),
		JobNames: schemaOf(jobNamesSchema, 'output'),
		Job: schemaOf(jobSchema, 'output'),
		JobEdit: schemaOf(jobEditSchema, 'input'),
		Order: schemaOf(orderSchema, 'input'),
		StepEdit: schemaOf(stepEditSchema, 'input'),
		StepChange: schemaOf(stepChangeSchema, 'input'),
		StepMove: schemaOf(stepMoveSchema, 'input'),
		JobPlans: schemaOf(jobPlansSchema, 'output'),
		TakePlan: schemaOf(takePlanSchema, 'input'),
		PlanAnswer: schemaOf(answerPlanSchema, 'input')
	}
};
