import type { ChangeResult } from '../db/changeRow';
import { ApiProblem } from './problem';

type Told =
	| ChangeResult
	| {
			readonly outcome: 'refused' | 'asks' | 'busy';
			readonly why: string;
			readonly field?: string | null;
	  };

/** Goes on where a change was made; otherwise tells a program what stood in its way. */
export function requireChanged(result: Told): void {
	switch (result.outcome) {
		case 'changed':
			return;
		case 'gone':
			throw new ApiProblem(404, 'There is none such any more.');
		case 'stale':
			throw new ApiProblem(409, `${result.why} The revision now is ${result.revision}.`, [
				{ pointer: '/revision', detail: `is not ${result.revision}` }
			]);
		case 'asks':
			throw new ApiProblem(409, `${result.why} Ask again with settled=true.`);
		case 'busy':
			throw new ApiProblem(503, result.why, undefined, { 'retry-after': '60' });
		case 'refused':
			throw new ApiProblem(
				409,
				result.why,
				result.field ? [{ pointer: `/${result.field}`, detail: result.why }] : undefined
			);
	}
}
