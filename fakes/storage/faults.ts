import { z } from 'zod';

const times = {
	/** How many answers to spoil; all of them when left out. */
	times: z.int().min(1).optional()
};

/** What can go wrong with a store's answers. */
export const faultSchema = z.discriminatedUnion('kind', [
	z.strictObject({ kind: z.literal('delay'), milliseconds: z.int().min(0), ...times }),
	z.strictObject({
		kind: z.literal('serverError'),
		status: z.int().min(500).max(599).default(503),
		...times
	}),
	z.strictObject({ kind: z.literal('denied'), ...times }),
	/** An object's bytes are fewer than the answer says, and the connection breaks. */
	z.strictObject({ kind: z.literal('brokenOff'), ...times }),
	/** From the second part of a multipart upload on, parts are refused. */
	z.strictObject({ kind: z.literal('laterPartsRefused'), ...times })
]);
export type Fault = z.input<typeof faultSchema>;
export type ActiveFault = z.output<typeof faultSchema>;
export const faultsSchema = z.array(faultSchema);

/** The faults in force, used up as answers are spoilt. */
export class FaultBox {
	#faults: ActiveFault[] = [];

	set(faults: Fault[]): void {
		this.#faults = faultsSchema.parse(faults);
	}

	/** The fault of a kind for the next answer, if there is one. */
	take<K extends ActiveFault['kind']>(kind: K): Extract<ActiveFault, { kind: K }> | undefined {
		const found = this.#faults.find(
			(fault): fault is Extract<ActiveFault, { kind: K }> => fault.kind === kind
		);
		if (found?.times === undefined) return found;
		found.times -= 1;
		if (found.times === 0) this.#faults = this.#faults.filter((it) => it !== found);
		return found;
	}

	list(): ActiveFault[] {
		return this.#faults;
	}
}
