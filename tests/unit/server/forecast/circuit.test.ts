import { describe, expect, it } from 'vitest';
import {
	afterFailure,
	attemptsAllowed,
	CLOSED,
	isOpen,
	type Circuit
} from '../../../../src/lib/server/forecast/circuit';
import { ForecastTrouble, type TroubleCode } from '../../../../src/lib/server/forecast/trouble';
import { NOW } from './answers';

const now = new Date(NOW * 1000);
const trouble = (code: TroubleCode, retryAt: number | null = null) =>
	new ForecastTrouble(code, 'It did not work.', retryAt);
const failed = (times: number, code: TroubleCode = 'timeout'): Circuit =>
	Array.from({ length: times }).reduce<Circuit>((c) => afterFailure(c, trouble(code), now), CLOSED);
const minutesOpen = ({ openUntil }: Circuit) =>
	openUntil === null ? 0 : (openUntil.getTime() - now.getTime()) / 60_000;

describe('a circuit', () => {
	it('stays closed for two failures and opens with the third', () => {
		expect([1, 2, 3].map((n) => isOpen(failed(n), now))).toEqual([false, false, true]);
	});
	it('opens for twice as long each time, up to two hours', () => {
		expect([3, 4, 5, 6, 12].map((n) => minutesOpen(failed(n)))).toEqual([30, 60, 120, 120, 120]);
	});
	it('is half open when its time has passed: one try', () => {
		const circuit = failed(3);
		const later = new Date(now.getTime() + 30 * 60_000);
		expect(isOpen(circuit, later)).toBe(false);
		expect(attemptsAllowed(circuit)).toBe(1);
		expect(attemptsAllowed(CLOSED)).toBe(3);
	});
	it('opens at once when the request itself is refused', () => {
		expect(isOpen(failed(1, 'refused'), now)).toBe(true);
	});
	it('waits for as long as the provider asks, from the first failure on', () => {
		const circuit = afterFailure(CLOSED, trouble('rateLimited', NOW + 7_200), now);
		expect(minutesOpen(circuit)).toBe(120);
		expect(minutesOpen(afterFailure(CLOSED, trouble('rateLimited'), now))).toBe(15);
	});
	it('is not moved by what is our own fault', () => {
		expect(afterFailure(CLOSED, trouble('noContact'), now)).toEqual(CLOSED);
	});
});
