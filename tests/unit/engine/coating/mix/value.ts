import type { MixError, Mixed } from '../../../../../src/lib/engine/coating/mix/mixError';

/** The value of what must have one; fails the test with the reason where it has none. */
export function valueOf<T>(result: Mixed<T>): T {
	if (!result.ok) throw new Error(`not mixed: ${JSON.stringify(result.error)}`);
	return result.value;
}

/** The reason of what must have none. */
export function errorOf<T>(result: Mixed<T>): MixError {
	if (result.ok) throw new Error('mixed, where a reason was looked for');
	return result.error;
}
