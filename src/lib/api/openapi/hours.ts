import { hoursSchema } from '../hours';
import { readingSchema } from '../reading';
import { answer, parameter, problems, schemaOf, SIGNED_IN, SLUG, UUID, type Part } from './parts';

/** The Hours page and the readings behind it. */
export const hoursPart: Part = {
	paths: {
		'/yards/{slug}/hours': {
			get: {
				operationId: 'hoursOfYard',
				summary: 'The Hours page: every queued step you may see, on one axis',
				security: SIGNED_IN,
				parameters: [SLUG],
				responses: { 200: answer('The hours', 'Hours'), ...problems(401, 404) }
			}
		},
		'/yards/{slug}/steps/{step}/reading': {
			get: {
				operationId: 'readHour',
				summary: 'Every limit of a step in one quarter-hour',
				security: SIGNED_IN,
				parameters: [
					SLUG,
					parameter('step', 'path', 'The step', UUID),
					parameter('at', 'query', 'Any instant in the quarter-hour', {
						type: 'string',
						format: 'date-time'
					})
				],
				responses: { 200: answer('The reading', 'Reading'), ...problems(400, 401, 404) }
			}
		}
	},
	schemas: {
		Hours: schemaOf(hoursSchema, 'output'),
		Reading: schemaOf(readingSchema, 'output')
	}
};
