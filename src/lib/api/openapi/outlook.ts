import { outlookRequestSchema } from '../outlook/request';
import { outlookResponseSchema } from '../outlook/response';
import { answer, body, problems, schemaOf, SIGNED_IN, type Part } from './parts';

/** Judging a chain that is sent along. */
export const outlookPart: Part = {
	paths: {
		'/outlook': {
			post: {
				operationId: 'judgeChain',
				summary:
					'Judge a chain of steps in a forecast and its members, and plan it; nothing is stored',
				security: [{}, ...SIGNED_IN],
				requestBody: body('OutlookRequest'),
				responses: {
					200: answer('The hours of each step, the plans, warnings and remedies', 'Outlook'),
					...problems(400, 413, 415, 429)
				}
			}
		}
	},
	schemas: {
		OutlookRequest: schemaOf(outlookRequestSchema, 'input'),
		Outlook: schemaOf(outlookResponseSchema, 'output')
	}
};
