import { cureProgress, DONE } from '../../coating/cure';
import { rateTable } from '../../coating/rates';
import { asksNoWait } from '../../coating/times';
import type { Site } from '../weather/site';
import type { FaceConditions } from '../weather/slots';
import { airLimits, faceLimits } from './applyLimits';
import type { ErrorSeries } from './errors';
import { stepMasks } from './judge';
import { markBroken } from './limit';
import { dryingIsSilent, phasesOf, type PhaseLimits, type PhaseTime } from './phases';
import type { Step } from './step';

/** Slots that the air alone shuts, by the limits that ask it; kept for the faces that share the air. */
const remembered = new WeakMap<Float64Array, Map<string, Uint8Array>>();

/** 1 where the air at a face shuts a step: the limits that no surface enters. */
function shutByAir(step: Step, face: FaceConditions, site: Site, errors: ErrorSeries): Uint8Array {
	const shutBy = (): Uint8Array => {
		const shut = new Uint8Array(face.weather.grid.count);
		for (const limit of airLimits(step, face, 0, site, errors)) markBroken(limit, shut);
		return shut;
	};
	// Every stand has a lee of its own: not kept, they would fill the memory.
	if (face.lee.length > 0) return shutBy();
	const { airTemperature, relativeHumidity, wind, gust, windHeight, rainFree, sand } = step.limits;
	const key = JSON.stringify([
		[airTemperature, relativeHumidity, wind, gust, windHeight, rainFree, sand],
		[face.rainReaches, face.dustReaches, face.windFactor]
	]);
	const ofAir = remembered.get(face.airTemperature) ?? new Map<string, Uint8Array>();
	remembered.set(face.airTemperature, ofAir);
	const before = ofAir.get(key);
	if (before !== undefined) return before;
	const shut = shutBy();
	ofAir.set(key, shut);
	return shut;
}

/** Shuts the slots after which a phase would not hold until its clocks are done. */
function shutByPhase(
	phase: PhaseLimits,
	face: FaceConditions,
	progressOf: (name: PhaseTime) => Float64Array | null,
	broken: Uint8Array,
	shut: Uint8Array
): void {
	const { limits, until, needs, mayRunPast } = phase;
	const { knownTo } = face.weather;
	broken.fill(0);
	for (const limit of limits) markBroken(limit, broken);
	if (needs !== null)
		for (let i = 0; i < broken.length; i++) if (needs[i] !== needs[i]) broken[i] = 1;
	const clocks = until.flatMap((name) => progressOf(name) ?? []);
	if (clocks.length === 0) return;
	// Backwards, so that the next broken slot is at hand: every clock must be done before it.
	let next = knownTo;
	for (let i = Math.min(shut.length, knownTo) - 1; i >= 0; i--) {
		// The last stroke lies at the end of slot i; `next` is the first broken slot after it.
		if (!shut[i] && !(mayRunPast && next === knownTo)) {
			for (const progress of clocks) {
				if (progress[next] - progress[i + 1] < DONE) {
					shut[i] = 1;
					break;
				}
			}
		}
		if (broken[i]) next = i;
	}
}

/**
 * 1 for slots in which a step may go on, and no more: the states of a judgement without their
 * rooms, for the many members of an ensemble. Runs shorter than the step count.
 *
 * @param errors - usual errors of the weather; only rooms depend on them, so any will do
 */
export function workableSlots(
	step: Step,
	conditions: readonly FaceConditions[],
	site: Site,
	errors: ErrorSeries
): Uint8Array {
	const { weather } = conditions[0];
	const { count } = weather.grid;
	const workable = new Uint8Array(count);
	if (dryingIsSilent(step)) return workable;
	const shut = shutByAir(step, conditions[0], site, errors).slice();
	const { work, daylight } = stepMasks(step, site, weather.grid);
	if (work !== null) for (let i = 0; i < count; i++) if (!work[i]) shut[i] = 1;
	if (daylight !== null) for (let i = 0; i < count; i++) if (!daylight[i]) shut[i] = 1;
	const broken = new Uint8Array(count);
	const curingMin = step.limits.curing?.min ?? -Infinity;
	conditions.forEach((face, index) => {
		if (index > 0) {
			const byAir = shutByAir(step, face, site, errors);
			for (let i = 0; i < count; i++) if (byAir[i]) shut[i] = 1;
		}
		for (const limit of faceLimits(step, face, index, errors)) markBroken(limit, shut);
		const known = new Map<PhaseTime, Float64Array>();
		const progressOf = (name: PhaseTime): Float64Array | null => {
			const table = step.times[name] ?? null;
			if (asksNoWait(table)) return null;
			const progress =
				known.get(name) ??
				cureProgress(rateTable(table, 'earliest'), face.surfaceShaded, curingMin);
			known.set(name, progress);
			return progress;
		};
		phasesOf(step, face, index, errors).forEach((phase, i) => {
			// The first is the wet phase, which must end inside the forecast even where it has no limits.
			if (i === 0 || phase.limits.length > 0) shutByPhase(phase, face, progressOf, broken, shut);
		});
	});
	const end = Math.min(count, weather.knownTo);
	for (let i = Math.max(0, weather.knownFrom); i < end; i++) if (!shut[i]) workable[i] = 1;
	return workable;
}
