import { filesPart } from './files';
import { forecastPart } from './forecast';
import { hoursPart } from './hours';
import { jobsPart } from './jobs';
import { installationPart } from './installation';
import { listsPart } from './lists';
import { outlookPart } from './outlook';
import { schemaOf, type Json, type Part } from './parts';
import { yardPart } from './yard';
import { problemSchema } from '../problem';
import { SCOPES } from '../tokens';

/** One file for each subject; what a subject gains is described there. */
const PARTS: readonly Part[] = [
	outlookPart,
	hoursPart,
	forecastPart,
	yardPart,
	jobsPart,
	filesPart,
	listsPart,
	installationPart
];

/** Every route of `/api/v1`, described. Schemas are those the routes parse and answer with. */
export function openApiDocument(): Json {
	return {
		openapi: '3.1.0',
		info: {
			title: 'Yardglass',
			version: '1',
			description:
				'Best hours for every queued coat from an hourly forecast. Errors are problem documents (RFC 9457). Lists answer `{ items, next }`; the same address with `.csv` gives the whole list as CSV (RFC 4180).'
		},
		servers: [{ url: '/api/v1' }],
		paths: Object.assign({}, ...PARTS.map(({ paths }) => paths)) as Json,
		components: {
			securitySchemes: {
				session: { type: 'apiKey', in: 'cookie', name: 'yardglass-session' },
				token: {
					type: 'http',
					scheme: 'bearer',
					bearerFormat: 'yg_…',
					description: `A personal access token, made on the page about you. It holds some of: ${SCOPES.join(', ')}.`
				}
			},
			schemas: {
				...(Object.assign({}, ...PARTS.map(({ schemas }) => schemas)) as Json),
				Problem: schemaOf(problemSchema, 'output')
			}
		}
	};
}
