/**
 * The line across everything on a page, at one slot. The pointer moves it while it hovers; the keys
 * and a tap hold it until they let it go.
 */
export class ReadingLine {
	#slot = $state.raw<number | null>(null);
	#held = $state.raw(false);

	/** The slot it stands at; null while nothing is read. */
	get slot(): number | null {
		return this.#slot;
	}

	/** Whether keys or a tap put it there, so that it must be kept in view. */
	get held(): boolean {
		return this.#held;
	}

	/** The pointer passes over a slot. */
	pass(slot: number): void {
		this.#slot = slot;
		this.#held = false;
	}

	/** Keys or a tap set it down at a slot. */
	hold(slot: number): void {
		this.#slot = slot;
		this.#held = true;
	}

	/** The pointer has gone: what was only hovered over goes with it. */
	leave(): void {
		if (!this.#held) this.#slot = null;
	}

	/** Nothing is read any more. */
	drop(): void {
		this.#slot = null;
		this.#held = false;
	}
}
