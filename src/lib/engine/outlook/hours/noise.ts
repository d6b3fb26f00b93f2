import type { Method, StepKind } from '../../vocabulary';
import type { Step } from './step';

/** Washers, scrapers, sanders and blasters are heard over the fence (common practice). */
const NOISY_KINDS: readonly StepKind[] = ['wash', 'strip', 'abrade', 'blast'];
/** Each spray is driven by a turbine, a compressor or a pump. */
const NOISY_METHODS: readonly Method[] = ['hvlp', 'airSpray', 'airless'];

/** Whether quiet hours stop a step: sanders and blowers, not brushes. */
export function isNoisy({ kind, method }: Pick<Step, 'kind' | 'method'>): boolean {
	return NOISY_KINDS.includes(kind) || NOISY_METHODS.includes(method);
}
