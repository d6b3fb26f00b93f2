import {
	methodLimits,
	SAMPLE_SHEETS,
	taskOf,
	timesBefore,
	type Limits,
	type Method,
	type SampleName,
	type TaskCode,
	type Times
} from '../../engine';

/** A step as a queue is written down before it is laid: its sample sheet or rule, and on which faces. */
export interface WrittenStep<Face> {
	readonly method: Method;
	readonly faces: readonly Face[];
	readonly sheet?: SampleName;
	/** The rule of work without a sheet. */
	readonly task?: TaskCode;
	readonly limits?: Limits;
}

/** The coat that a step's own is next covered by; null where none follows on one of its faces. */
function nextCoatOf<Face>(
	steps: readonly WrittenStep<Face>[],
	order: number
): WrittenStep<Face> | null {
	const { faces } = steps[order];
	const next = steps
		.slice(order + 1)
		.find((it) => it.sheet !== undefined && it.faces.some((face) => faces.includes(face)));
	return next ?? null;
}

/**
 * Limits and times that a step has beside its sheet's: the most wind of its method, the
 * overcoat times toward the very coat that follows, the rule of work without a sheet.
 */
export function stepRules<Face>(
	steps: readonly WrittenStep<Face>[],
	order: number
): { limits: Limits; times: Times } {
	const step = steps[order];
	const task = step.task === undefined ? null : taskOf(step.task);
	if (step.sheet === undefined)
		return { limits: { ...task?.limits, ...step.limits }, times: { ...task?.times } };
	const sheet = SAMPLE_SHEETS[step.sheet];
	const { wind, gust } = methodLimits(sheet, step.method).limits;
	const next = nextCoatOf(steps, order);
	const pair = next?.sheet === undefined ? null : SAMPLE_SHEETS[next.sheet].type;
	const { times, overcoatMin, overcoatMax } = timesBefore(sheet, pair);
	return {
		limits: { wind, gust, ...step.limits },
		times: {
			...(overcoatMin === 'pair' ? { overcoatMin: times.overcoatMin } : {}),
			...(overcoatMax === 'pair' ? { overcoatMax: times.overcoatMax } : {})
		}
	};
}
