import { POSITION_ROUNDING, type Chain } from './chain';
import { heaviestClosure } from './closure';
import { earliestWay, latestWay, type Domains } from './lattice';

/**
 * The way through a chain with the greatest sum of its starts' scores; of equal ones the one that
 * starts earliest at every step (the best ways are a lattice as all ways are). Null: no way.
 *
 * One node says "this step starts at this place or later". It adds what its score has over the
 * place before, and asks for the place before and for what the gaps ask of other steps: the best
 * way is the heaviest closed set, less its last places.
 *
 * @returns indices of the starts taken
 */
export function heaviestWay(chain: Chain, domains: Domains): Int32Array | null {
	const { steps, gaps } = chain;
	const low = earliestWay(chain, domains).places;
	if (low === null) return null;
	const high = latestWay(chain, domains);
	const scoreAt = (step: number, place: number): number => steps[step].score[domains[step][place]];
	// The first place of a step is always taken and has no node.
	const offset = new Int32Array(steps.length + 1);
	for (let i = 0; i < steps.length; i++) offset[i + 1] = offset[i] + high[i] - low[i];
	const weights = new Float64Array(offset[steps.length]);
	const from: number[] = [];
	const to: number[] = [];
	const nodeOf = (step: number, place: number): number => offset[step] + place - low[step] - 1;
	let isLevel = true;
	steps.forEach((_, step) => {
		for (let place = low[step] + 1; place <= high[step]; place++) {
			const weight = scoreAt(step, place) - scoreAt(step, place - 1);
			weights[nodeOf(step, place)] = weight;
			if (weight > 0) isLevel = false;
			if (place - 1 === low[step]) continue;
			from.push(nodeOf(step, place));
			to.push(nodeOf(step, place - 1));
		}
	});
	const startsAt = (places: Int32Array): Int32Array =>
		places.map((place, step) => domains[step][place]);
	// Nothing is won by a later start.
	if (isLevel) return startsAt(low);
	for (const gap of gaps) {
		const { start } = steps[gap.to];
		const before = domains[gap.from];
		const after = domains[gap.to];
		let asked = low[gap.to];
		for (let place = low[gap.from] + 1; place <= high[gap.from]; place++) {
			const was = asked;
			while (start[after[asked]] < gap.earliest[before[place]] - POSITION_ROUNDING) asked++;
			// What the place before asks for is asked for already.
			if (asked === was) continue;
			from.push(nodeOf(gap.from, place));
			to.push(nodeOf(gap.to, asked));
		}
		asked = low[gap.from];
		for (let place = low[gap.to] + 1; place <= high[gap.to]; place++) {
			const was = asked;
			while (gap.latest[before[asked]] < start[after[place]] - POSITION_ROUNDING) asked++;
			if (asked === was) continue;
			from.push(nodeOf(gap.to, place));
			to.push(nodeOf(gap.from, asked));
		}
	}
	const kept = heaviestClosure({ weights, from, to });
	return startsAt(
		low.map((place, step) => {
			let at = place;
			while (at < high[step] && kept[nodeOf(step, at + 1)] === 1) at++;
			return at;
		})
	);
}
