import type { SLOT_SECONDS } from '../engine';

/**
 * Length of a slot, ms. The engine's number, held to it by its type: importing the value would
 * bring the engine's schemas into the browser.
 */
const SECONDS: typeof SLOT_SECONDS = 900;
export const SLOT_MS = SECONDS * 1000;
export const SLOTS_PER_HOUR = 3600 / SECONDS;

/** Epoch ms at which a slot begins, on an axis whose slot 0 begins at `start` (ISO 8601). */
export function slotStart(start: string, slot: number): number {
	return Date.parse(start) + slot * SLOT_MS;
}

/** Where an instant (epoch ms) lies on the axis, in slots and their fractions. */
export function slotAt(start: string, instant: number): number {
	return (instant - Date.parse(start)) / SLOT_MS;
}
