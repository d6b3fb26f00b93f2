import type { Hours } from '../../api/hours';
import { finding } from '../../sentences/finding';
import { bandsOf, emptyBands } from './bands';
import { frameOf, groupByBoat, type Ground } from './ground';
import { dayToSpeakOf } from './speech';
import { stepFacts } from './stepView';

/**
 * The page while its hours are being found: every boat, step and band where it will stand, and
 * every lath bare. No state is told of any hour.
 */
export function bareHours(ground: Ground): Hours {
	const { membership, now, queue, axis, weather } = ground;
	return {
		...frameOf(ground),
		spokenDay: dayToSpeakOf(membership.yard.timeZone, now),
		// The only step is the one that will be spoken of; of several nobody knows yet.
		spokenStep: queue.length === 1 ? queue[0].step.id : null,
		...finding(queue.length),
		bands: weather === null ? emptyBands(axis.slotCount) : bandsOf(weather, axis, null),
		boats: groupByBoat(queue, (queued) => ({
			...stepFacts(queued),
			runs: [],
			best: null,
			bestByDay: axis.days.map(() => null),
			flags: [],
			spoken: ''
		}))
	};
}
