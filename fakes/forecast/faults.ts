import { z } from 'zod';

/** Whose answers a fault spoils. */
export const TARGETS = ['open-meteo', 'open-meteo-ensemble', 'met-norway'] as const;
export type Target = (typeof TARGETS)[number];

const times = {
	/** How many answers to spoil; all of them when left out. */
	times: z.int().min(1).optional()
};

export const faultSchema = z.discriminatedUnion('kind', [
	z.strictObject({ kind: z.literal('delay'), milliseconds: z.int().min(0), ...times }),
	z.strictObject({
		kind: z.literal('rateLimited'),
		/** As in the header: seconds, or an HTTP date. */
		retryAfter: z.string().optional(),
		...times
	}),
	z.strictObject({
		kind: z.literal('serverError'),
		status: z.int().min(500).max(599).default(500),
		retryAfter: z.string().optional(),
		...times
	}),
	/** The body ends in the middle, and says it is whole. */
	z.strictObject({ kind: z.literal('truncated'), ...times }),
	/** The body is shorter than it says, and the connection breaks. */
	z.strictObject({ kind: z.literal('brokenOff'), ...times }),
	/** A bare NaN among the temperatures. */
	z.strictObject({ kind: z.literal('nan'), ...times }),
	/** Temperatures missing over some hours. */
	z.strictObject({
		kind: z.literal('nulls'),
		lead: z.int().default(6),
		hours: z.int().min(1).default(6),
		...times
	}),
	/** One hour is not there at all. */
	z.strictObject({ kind: z.literal('missingHour'), lead: z.int().default(6), ...times }),
	/** Two hours have changed places. */
	z.strictObject({ kind: z.literal('outOfOrder'), lead: z.int().default(6), ...times }),
	/** Local clock time instead of UTC, over a change of clock some hours ahead. */
	z.strictObject({
		kind: z.literal('daylightSaving'),
		change: z.enum(['spring', 'autumn']),
		lead: z.int().default(30),
		...times
	}),
	/** An old answer. */
	z.strictObject({ kind: z.literal('staleIssue'), hours: z.int().min(1).default(48), ...times }),
	/** Wind in km/h, and the unit says so. */
	z.strictObject({ kind: z.literal('wrongUnits'), ...times }),
	/** One series is shorter than the hours (Open-Meteo only; GeoJSON cannot be so). */
	z.strictObject({ kind: z.literal('shortSeries'), ...times })
]);
export type Fault = z.input<typeof faultSchema>;
export type ActiveFault = z.output<typeof faultSchema>;

export const faultsSchema = z.partialRecord(z.enum(TARGETS), z.array(faultSchema));
export type Faults = z.input<typeof faultsSchema>;

/** The faults in force, used up as answers are spoilt. */
export class FaultBox {
	#faults = new Map<Target, ActiveFault[]>();

	set(faults: Faults): void {
		this.#faults = new Map(
			Object.entries(faultsSchema.parse(faults)).map(([target, list]) => [
				z.enum(TARGETS).parse(target),
				list ?? []
			])
		);
	}

	/** The faults for the next answer. */
	take(target: Target): ActiveFault[] {
		const list = this.#faults.get(target) ?? [];
		this.#faults.set(
			target,
			list.flatMap((fault) => {
				if (fault.times === undefined) return [fault];
				return fault.times > 1 ? [{ ...fault, times: fault.times - 1 }] : [];
			})
		);
		return list;
	}

	/** What is still in force. */
	list(): Faults {
		return Object.fromEntries(this.#faults);
	}
}

/** The fault of a kind in a list, if it is there. */
export function find<K extends ActiveFault['kind']>(
	faults: readonly ActiveFault[],
	kind: K
): Extract<ActiveFault, { kind: K }> | undefined {
	return faults.find((fault): fault is Extract<ActiveFault, { kind: K }> => fault.kind === kind);
}

/**
 * Local clock time by which the hours of a `daylightSaving` fault are stamped.
 *
 * @returns seconds ahead of UTC
 */
export function localOffset(
	fault: Extract<ActiveFault, { kind: 'daylightSaving' }>,
	time: number,
	now: number
): number {
	const changed = time >= now + fault.lead * 3_600;
	return (fault.change === 'spring') === changed ? 7_200 : 3_600;
}

/** A value that JSON cannot hold, to be put into the text afterwards. */
export const NAN_MARK = '@@NaN@@';
export const withBareNaN = (json: string): string => json.replaceAll(`"${NAN_MARK}"`, 'NaN');
