import type { Axis, Span } from '../charts/axis';
import { DENSE_PX_PER_HOUR, type BattenMeasures } from './measures';

/** Hours whose tick is cut deeper. */
const DEEP_HOURS = [6, 12, 18];

/** SVG paths of the ticks, by what they are cut into and how deep. */
export interface TickPaths {
	readonly bare: string;
	readonly bareDeep: string;
	readonly painted: string;
	readonly paintedDeep: string;
}

const on = (spans: readonly Span[], slot: number) =>
	spans.some((it) => it.from <= slot && slot < it.to);

/** Hour ticks from the lath's lower edge. Midnight has its notch, and tape covers what it lies on. */
export function tickPaths(
	axis: Axis,
	measures: Pick<BattenMeasures, 'height' | 'tick' | 'deepTick'>,
	painted: readonly Span[]
): TickPaths {
	const paths = { bare: '', bareDeep: '', painted: '', paintedDeep: '' };
	for (const { slot, hour } of axis.hours) {
		const deep = DEEP_HOURS.includes(hour);
		const skipped =
			hour === 0 || slot === axis.from || (!deep && axis.pxPerHour < DENSE_PX_PER_HOUR);
		if (skipped) continue;
		const { length } = deep ? measures.deepTick : measures.tick;
		const line = `M${axis.x(slot)} ${measures.height}v${-length}`;
		if (on(painted, slot)) paths[deep ? 'paintedDeep' : 'painted'] += line;
		else paths[deep ? 'bareDeep' : 'bare'] += line;
	}
	return paths;
}
