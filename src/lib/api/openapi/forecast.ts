import { refreshSchema } from '../refresh';
import { answer, problems, schemaOf, SIGNED_IN, SLUG, type Part } from './parts';

/** The forecast of a yard. */
export const forecastPart: Part = {
	paths: {
		'/yards/{slug}/forecast': {
			post: {
				operationId: 'askForecast',
				summary: 'Ask the forecast provider now, as far as its terms allow',
				security: SIGNED_IN,
				parameters: [SLUG],
				responses: { 200: answer('What came of it', 'Refresh'), ...problems(401, 403, 404) }
			}
		}
	},
	schemas: { Refresh: schemaOf(refreshSchema, 'output') }
};
