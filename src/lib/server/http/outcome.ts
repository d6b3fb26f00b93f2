import { error, fail } from '@sveltejs/kit';
import type { Outcome } from '../jobs/outcome';
import { ApiProblem } from './problem';

/** What a form is told of an outcome that is not `done`; what is gone answers 404. */
export function refusal<Values>(outcome: Exclude<Outcome, { outcome: 'done' }>, values: Values) {
	switch (outcome.outcome) {
		case 'gone':
			return error(404, 'That is not there any more, or it is not yours to see.');
		case 'stale':
			return fail(409, {
				values,
				errors: {} as Record<string, string>,
				message: outcome.why,
				revision: outcome.revision
			});
		case 'refused':
			return fail(400, {
				values,
				errors: (outcome.field === undefined ? {} : { [outcome.field]: outcome.why }) as Record<
					string,
					string
				>,
				message: outcome.field === undefined ? outcome.why : '',
				revision: null
			});
	}
}

/** The same told to a program. */
export function refusedProblem(outcome: Exclude<Outcome, { outcome: 'done' }>): ApiProblem {
	switch (outcome.outcome) {
		case 'gone':
			return new ApiProblem(404, 'That is not there any more, or it is not yours to see.');
		case 'stale':
			return new ApiProblem(409, outcome.why, [
				{ pointer: '/revision', detail: `is ${outcome.revision} by now` }
			]);
		case 'refused':
			return new ApiProblem(
				400,
				outcome.why,
				outcome.field === undefined
					? undefined
					: [{ pointer: `/${outcome.field}`, detail: outcome.why }]
			);
	}
}
