import { boatsSchema } from '../lists/boats';
import { changesSchema } from '../lists/changes';
import { peopleSchema } from '../lists/people';
import { stepsSchema } from '../lists/steps';
import { ROLES } from '../roles';
import { STEP_STATES } from '../jobs';
import { STEP_KINDS } from '../../engine';
import {
	answer,
	csvAnswer,
	LIST_PARAMETERS,
	optional,
	problems,
	schemaOf,
	SIGNED_IN,
	SLUG,
	UUID,
	type Json,
	type Part
} from './parts';

const ofPainter = optional('painter', 'Only those of a painter', UUID);
const oneOf = (words: readonly string[]): Json => ({ type: 'string', enum: words });

/** A list and its CSV, which takes the same filters. */
function list(
	name: string,
	what: string,
	schema: string,
	filters: readonly Json[],
	...statuses: number[]
): Json {
	const parameters = [SLUG, ...LIST_PARAMETERS, ...filters];
	const failed = problems(400, 401, 404, ...statuses);
	const id = `${name[0].toUpperCase()}${name.slice(1)}`;
	return {
		[`/yards/{slug}/${name}`]: {
			get: {
				operationId: `list${id}`,
				summary: what,
				security: SIGNED_IN,
				parameters,
				responses: { 200: answer('A page of the list', schema), ...failed }
			}
		},
		[`/yards/{slug}/${name}.csv`]: {
			get: {
				operationId: `export${id}`,
				summary: `${what}: all of them, as CSV`,
				security: SIGNED_IN,
				parameters: parameters.filter(({ name: it }) => it !== 'limit'),
				responses: { 200: csvAnswer('The list'), ...failed }
			}
		}
	};
}

/** The lists of a yard. */
export const listsPart: Part = {
	paths: {
		...list('boats', 'Boats you may see, by name; `q` looks into boat, owner and stand', 'Boats', [
			optional('owner', 'Only those of an owner', UUID),
			ofPainter,
			optional('stand', 'Only those on a stand', UUID)
		]),
		...list(
			'steps',
			'Steps you may see, what changed last first; `q` looks into job, boat, owner and stand',
			'Steps',
			[
				optional('state', 'Only those in a state', oneOf(STEP_STATES)),
				optional('kind', 'Only those of a kind', oneOf(STEP_KINDS)),
				optional('boat', 'Only those of a boat', UUID),
				ofPainter
			]
		),
		...list(
			'people',
			'People of the yard, by name; for managers',
			'People',
			[optional('role', 'Only those in a role', oneOf(ROLES))],
			403
		),
		...list(
			'changes',
			'Who changed what, the newest first; for managers',
			'Changes',
			[
				optional('person', 'Only those of a person', UUID),
				optional('boat', 'Only those of a boat', UUID),
				optional('subject', 'Only those of a kind of thing', { type: 'string' }),
				optional('from', 'Not before this day of the yard', { type: 'string', format: 'date' }),
				optional('to', 'Not after this day of the yard', { type: 'string', format: 'date' })
			],
			403
		),
		// The stands themselves are described with the yard's settings.
		...Object.fromEntries(
			Object.entries(
				list('stands', 'Stands in the yard’s order, with the boats on them you may see', '', [])
			).filter(([path]) => path.endsWith('.csv'))
		)
	},
	schemas: {
		Boats: schemaOf(boatsSchema, 'output'),
		Steps: schemaOf(stepsSchema, 'output'),
		People: schemaOf(peopleSchema, 'output'),
		Changes: schemaOf(changesSchema, 'output')
	}
};
