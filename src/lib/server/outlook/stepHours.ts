import { createHash } from 'node:crypto';
import {
	ENGINE_VERSION,
	faceConditions,
	missingVariables,
	stepHours,
	type FaceConditions,
	type Site,
	type SlotStates,
	type SlotWeather,
	type StepFlag,
	STEP_FLAGS
} from '../../engine';
import type { Database } from '../db/client';
import { keepHours, keptHours, type KeptHours } from '../db/outlookCache';
import type { QueuedStep } from '../db/queue';
import type { Yard } from '../db/schema';
import { faceOf, stepOf } from './engineInput';
import type { Axis } from './axis';

/** Hours of one step over the slots of the page's axis. */
export interface AxisHours extends SlotStates {
	readonly durationSlots: number;
	readonly flags: StepFlag[];
	readonly missing: readonly (readonly [number, number, string])[];
}

const toBase64 = (array: Uint8Array | Float32Array): string =>
	Buffer.from(array.buffer, array.byteOffset, array.byteLength).toString('base64');

function toBytes(text: string): Uint8Array {
	return Uint8Array.from(Buffer.from(text, 'base64'));
}

function unpack(kept: KeptHours): AxisHours {
	return {
		state: toBytes(kept.state),
		limiter: toBytes(kept.limiter),
		room: new Float32Array(toBytes(kept.room).buffer),
		durationSlots: kept.durationSlots,
		flags: STEP_FLAGS.filter((flag) => kept.flags.includes(flag)),
		missing: kept.missing
	};
}

function pack(hours: AxisHours): KeptHours {
	return {
		state: toBase64(hours.state),
		limiter: toBase64(hours.limiter),
		room: toBase64(hours.room),
		durationSlots: hours.durationSlots,
		flags: hours.flags,
		missing: hours.missing.map(([from, to, words]) => [from, to, words])
	};
}

/** Spans of the axis in which the forecast lacks something, with what it lacks in words. */
function missingSpans(weather: SlotWeather, axis: Axis): [number, number, string][] {
	const spans: [number, number, string][] = [];
	for (let i = 0; i < axis.slotCount; i++) {
		const words = missingVariables(weather, i + axis.offset).join(', ');
		if (words === '') continue;
		const last = spans[spans.length - 1];
		if (last !== undefined && last[1] === i && last[2] === words) last[1] = i + 1;
		else spans.push([i, i + 1, words]);
	}
	return spans;
}

/** Conditions of faces under shelters, computed once for all steps that share them. */
export function conditionsFor(weather: SlotWeather, site: Site) {
	const known = new Map<string, FaceConditions[]>();
	return (queued: QueuedStep): FaceConditions[] =>
		queued.faces.flatMap((row) => {
			const face = faceOf(row, queued);
			const key = JSON.stringify([face, queued.step.shelter]);
			const before = known.get(key);
			if (before !== undefined) return before;
			const made = faceConditions(weather, site, face, queued.step.shelter);
			known.set(key, made);
			return made;
		});
}

/** Key of a step's hours: the engine's whole input and its version. */
function keyOf(queued: QueuedStep, yard: Yard, site: Site, runId: string, axis: Axis): string {
	const input = [
		ENGINE_VERSION,
		runId,
		site,
		yard.looseSand,
		axis.start,
		axis.slotCount,
		stepOf(queued, yard),
		queued.step.shelter,
		queued.faces.map((row) => faceOf(row, queued))
	];
	return createHash('sha256').update(JSON.stringify(input)).digest('base64url');
}

/**
 * Hours of steps over the axis, from what is kept where its input is the same, else computed and
 * kept. A step without a face is judged on none and has no hours (it is left out).
 */
export async function hoursOfSteps(
	db: Database,
	steps: readonly QueuedStep[],
	yard: Yard,
	site: Site,
	weather: SlotWeather,
	runId: string,
	axis: Axis
): Promise<Map<string, AxisHours>> {
	const keys = new Map(steps.map((it) => [it.step.id, keyOf(it, yard, site, runId, axis)]));
	const kept = await keptHours(db, [...keys.values()]);
	const conditions = conditionsFor(weather, site);
	const missing = missingSpans(weather, axis);
	const result = new Map<string, AxisHours>();
	const fresh: { key: string; stepId: string; hours: KeptHours }[] = [];
	for (const queued of steps) {
		const { id } = queued.step;
		const key = keys.get(id) ?? '';
		const before = kept.get(key);
		if (before !== undefined) {
			result.set(id, unpack(before));
			continue;
		}
		const faces = conditions(queued);
		if (faces.length === 0) continue;
		const all = stepHours(stepOf(queued, yard), faces, site);
		const to = axis.offset + axis.slotCount;
		const hours: AxisHours = {
			state: all.state.slice(axis.offset, to),
			limiter: all.limiter.slice(axis.offset, to),
			room: all.room.slice(axis.offset, to),
			durationSlots: all.durationSlots,
			flags: [...all.flags],
			missing: all.silentDrying ? [[0, axis.slotCount, 'drying time on the sheet']] : missing
		};
		result.set(id, hours);
		fresh.push({ key, stepId: id, hours: pack(hours) });
	}
	await keepHours(db, fresh);
	return result;
}
