/**
 * Runs work a few at a time; the rest waits its turn, first come first served. For what takes
 * memory or a core for seconds, such as decoding pictures.
 */
export class Turns {
	#free: number;
	readonly #waiting: (() => void)[] = [];

	constructor(atOnce: number) {
		this.#free = atOnce;
	}

	async run<T>(work: () => Promise<T>): Promise<T> {
		if (this.#free > 0) this.#free -= 1;
		else await new Promise<void>((resolve) => this.#waiting.push(resolve));
		try {
			return await work();
		} finally {
			const next = this.#waiting.shift();
			if (next === undefined) this.#free += 1;
			else next();
		}
	}
}
