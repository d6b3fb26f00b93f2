import { fileSchema, filesSchema } from './files';
import { healthSchema } from './health';
import { hoursSchema } from './hours';
import { filePaths } from './openapiFiles';
import { answer, parameter, problems, schemaOf, SIGNED_IN, SLUG, type Json } from './openapiWords';
import { outlookRequestSchema } from './outlook/request';
import { outlookResponseSchema } from './outlook/response';
import { problemSchema } from './problem';
import { readingSchema } from './reading';
import { refreshSchema } from './refresh';

/** Every route of `/api/v1`, described. Schemas are those the routes parse and answer with. */
export function openApiDocument(): Json {
	return {
		openapi: '3.1.0',
		info: {
			title: 'Yardglass',
			version: '1',
			description:
				'Best hours for every queued coat from an hourly forecast. Errors are problem documents (RFC 9457).'
		},
		servers: [{ url: '/api/v1' }],
		paths: {
			'/outlook': {
				post: {
					operationId: 'judgeChain',
					summary:
						'Judge a chain of steps in a forecast and its members, and plan it; nothing is stored',
					security: [{}, ...SIGNED_IN],
					requestBody: {
						required: true,
						content: {
							'application/json': { schema: { $ref: '#/components/schemas/OutlookRequest' } }
						}
					},
					responses: {
						200: answer('The hours of each step, the plans, warnings and remedies', 'Outlook'),
						...problems(400, 413, 415, 429)
					}
				}
			},
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
						parameter('step', 'path', 'The step', { type: 'string', format: 'uuid' }),
						parameter('at', 'query', 'Any instant in the quarter-hour', {
							type: 'string',
							format: 'date-time'
						})
					],
					responses: { 200: answer('The reading', 'Reading'), ...problems(400, 401, 404) }
				}
			},
			'/yards/{slug}/forecast': {
				post: {
					operationId: 'askForecast',
					summary: 'Ask the forecast provider now, as far as its terms allow',
					security: SIGNED_IN,
					parameters: [SLUG],
					responses: { 200: answer('What came of it', 'Refresh'), ...problems(401, 403, 404) }
				}
			},
			...filePaths,
			'/health': {
				get: {
					operationId: 'health',
					summary: 'How the database, the providers and the queue do',
					security: [{}],
					responses: {
						200: answer('Able to serve', 'Health'),
						503: answer('The database does not answer', 'Health')
					}
				}
			},
			'/openapi.json': {
				get: {
					operationId: 'describe',
					summary: 'This document',
					security: [{}],
					responses: {
						200: {
							description: 'OpenAPI 3.1',
							content: { 'application/json': { schema: { type: 'object' } } }
						}
					}
				}
			}
		},
		components: {
			securitySchemes: {
				session: { type: 'apiKey', in: 'cookie', name: 'yardglass-session' }
			},
			schemas: {
				OutlookRequest: schemaOf(outlookRequestSchema, 'input'),
				Outlook: schemaOf(outlookResponseSchema, 'output'),
				Hours: schemaOf(hoursSchema, 'output'),
				Reading: schemaOf(readingSchema, 'output'),
				Refresh: schemaOf(refreshSchema, 'output'),
				File: schemaOf(fileSchema, 'output'),
				Files: schemaOf(filesSchema, 'output'),
				Health: schemaOf(healthSchema, 'output'),
				Problem: schemaOf(problemSchema, 'output')
			}
		}
	};
}
