import { normal, smoothNoise } from './noise';
import { NO_NUDGE, type Nudge } from './weather';

const HOUR = 3_600;

/**
 * How member `member` of an ensemble differs from the main run: little at first, more with every
 * day ahead, and for a spell of some hours in the same sense.
 *
 * @param member - 0 is the control, which differs too
 * @param run - of the ensemble, UTC epoch seconds
 */
export function memberNudge(time: number, member: number, run: number, seed: number): Nudge {
	const lead = Math.max(0, time - run) / HOUR;
	const growth = 1 - Math.exp(-lead / 72);
	const z = (kind: number) => smoothNoise(time, 12 * HOUR, seed, member, kind, run / HOUR);
	return {
		temperature: (0.2 + 1.8 * growth) * z(1),
		dewPoint: (0.2 + 1.6 * growth) * z(2),
		wind: Math.exp((0.05 + 0.3 * growth) * z(3)),
		direction: (4 + 35 * growth) * z(4),
		cloud: (3 + 25 * growth) * z(5),
		rain: Math.exp((0.1 + 0.7 * growth) * z(6)),
		early: Math.round(5 * HOUR * growth * normal(seed, member, run / HOUR))
	};
}

/** Two services never quite agree: MET Norway's fake sees the same weather a little differently. */
export function secondOpinion(time: number, seed: number): Nudge {
	return {
		...NO_NUDGE,
		temperature: 0.3 * smoothNoise(time, 12 * HOUR, seed, 101),
		dewPoint: 0.2 * smoothNoise(time, 12 * HOUR, seed, 102),
		wind: Math.exp(0.06 * smoothNoise(time, 12 * HOUR, seed, 103))
	};
}
