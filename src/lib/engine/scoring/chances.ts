import { z } from 'zod';

/** A chance that was told (0 to 1), and whether it came so. */
export const toldChanceSchema = z.strictObject({
	chance: z.number().min(0).max(1),
	happened: z.boolean()
});
export type ToldChance = z.infer<typeof toldChanceSchema>;

/** One step of the reliability table: chances told from `from` up to `to`, the last one included. */
export interface ReliabilityBin {
	readonly from: number;
	readonly to: number;
	readonly count: number;
	/** Mean of the chances told, and share that came so; null in an empty bin. */
	readonly told: number | null;
	readonly happened: number | null;
}

/** How good chances were. */
export interface ChanceScore {
	readonly count: number;
	/** Mean of (chance − outcome)²: 0 is perfect, 1 always wrong. Source: Brier 1950, half his sum. */
	readonly brier: number;
	/** How far told chances are from what came of them; 0 is perfect. */
	readonly reliability: number;
	/** How far outcomes differ between chances told; more is better. */
	readonly resolution: number;
	/** Variance of the outcomes themselves: the score of always telling their mean. */
	readonly uncertainty: number;
	/** 1 − Brier/uncertainty; null where all outcomes are alike. */
	readonly skill: number | null;
	readonly bins: readonly ReliabilityBin[];
}

const BINS = 10;

/**
 * Brier score, its parts (Murphy 1973: brier = reliability − resolution + uncertainty) and the
 * table behind them. The parts group chances that are told exactly alike, for which the identity
 * is exact; the table has ten steps for the eye. Null without a chance.
 */
export function chanceScore(told: readonly ToldChance[]): ChanceScore | null {
	const count = told.length;
	if (count === 0) return null;
	const outcome = ({ happened }: ToldChance): number => (happened ? 1 : 0);
	const mean = (list: readonly ToldChance[], value: (it: ToldChance) => number): number =>
		list.reduce((sum, it) => sum + value(it), 0) / list.length;
	const base = mean(told, outcome);
	const groups = new Map<number, ToldChance[]>();
	for (const it of told) groups.set(it.chance, [...(groups.get(it.chance) ?? []), it]);
	let reliability = 0;
	let resolution = 0;
	for (const [chance, group] of groups) {
		const happened = mean(group, outcome);
		reliability += (group.length / count) * (chance - happened) ** 2;
		resolution += (group.length / count) * (happened - base) ** 2;
	}
	const uncertainty = base * (1 - base);
	const brier = mean(told, (it) => (it.chance - outcome(it)) ** 2);
	return {
		count,
		brier,
		reliability,
		resolution,
		uncertainty,
		skill: uncertainty > 0 ? 1 - brier / uncertainty : null,
		bins: Array.from({ length: BINS }, (_, i): ReliabilityBin => {
			const inBin = told.filter(
				({ chance }) => Math.min(Math.floor(chance * BINS), BINS - 1) === i
			);
			return {
				from: i / BINS,
				to: (i + 1) / BINS,
				count: inBin.length,
				told: inBin.length === 0 ? null : mean(inBin, (it) => it.chance),
				happened: inBin.length === 0 ? null : mean(inBin, outcome)
			};
		})
	};
}
