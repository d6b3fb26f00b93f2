/** Digits kept before cutting: enough for any quantity here, few enough to drop binary dust. */
const SIGNIFICANT = 12;

function scaled(value: number, decimals: number): number {
	return Number((value * 10 ** decimals).toPrecision(SIGNIFICANT));
}

/** A value to `decimals`, halves away from zero, never "-0". */
export function rounded(value: number, decimals: number): string {
	const shifted = scaled(value, decimals);
	const whole = Math.sign(shifted) * Math.round(Math.abs(shifted));
	return (whole === 0 ? 0 : whole / 10 ** decimals).toFixed(decimals);
}

/**
 * Room to `decimals`, rounded towards the limit, so that nobody reads more than there is.
 * Inside the limit that is down to less room. Outside, a breach is never shown as none:
 * it is cut towards the limit too, but not past the last digit shown.
 */
export function roundedTowardsLimit(room: number, decimals: number): string {
	const shifted = scaled(room, decimals);
	const cut = Math.trunc(shifted);
	const kept = cut === 0 && shifted < 0 ? -1 : cut;
	return (kept === 0 ? 0 : kept / 10 ** decimals).toFixed(decimals);
}
