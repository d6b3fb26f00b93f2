import { setTimeout as pause } from 'node:timers/promises';

/** How long somebody who still sends is left to read the answer before the line is cut. */
const GRACE_MS = 1_500;
/** Up to this much more is read and thrown away, so that who was nearly done may finish. */
const GRACE_BYTES = 2_000_000;

/** The bytes of a request as they come. Whoever stops early leaves the rest unread. */
export const sentBytes = (body: ReadableStream<Uint8Array>): AsyncIterable<Uint8Array> =>
	body.values({ preventCancel: true }) as AsyncIterable<Uint8Array>;

/**
 * After a refusal: what is still being sent is not wanted. To cut the line at once would lose the
 * answer on its way, so that comes a moment later. Returns at once.
 */
export function hangUpSoon(body: ReadableStream<Uint8Array>): void {
	if (body.locked) return;
	const reader = body.getReader();
	const graceOver = pause(GRACE_MS, null, { ref: false });
	const discard = async (): Promise<void> => {
		let bytes = 0;
		while (bytes < GRACE_BYTES) {
			const chunk = await Promise.race([reader.read(), graceOver]);
			if (chunk === null || chunk.done) break;
			bytes += chunk.value.byteLength;
		}
		if (bytes >= GRACE_BYTES) await graceOver;
		await reader.cancel();
	};
	// The sender has gone by itself: nothing is left to hang up on.
	discard().catch(() => undefined);
}
