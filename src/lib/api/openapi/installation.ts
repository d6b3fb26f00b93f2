import { healthSchema } from '../health';
import { answer, schemaOf, type Part } from './parts';

/** What an installation says of itself. */
export const installationPart: Part = {
	paths: {
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
	schemas: { Health: schemaOf(healthSchema, 'output') }
};
