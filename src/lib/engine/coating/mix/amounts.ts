import type { MixRatio } from '../sheet/mixRatio';
import { mixed, unmixed, type Mixed } from './mixError';

/** One part of a mix; null where its density is not known and it takes one to tell. */
export interface PartAmount {
	readonly name: string;
	readonly litres: number | null;
	readonly kilograms: number | null;
}

export interface Amounts {
	readonly parts: readonly PartAmount[];
	readonly litres: number | null;
	readonly kilograms: number | null;
}

/** How much is wanted in all. */
export type Total = { readonly litres: number } | { readonly kilograms: number };

const sumOf = (values: readonly (number | null)[]): number | null =>
	values.reduce<number | null>(
		(sum, value) => (sum === null || value === null ? null : sum + value),
		0
	);

/**
 * The parts of a mix of so many litres or kilograms. A ratio by volume measured by mass, or the
 * other way about, is converted by the densities of the parts (volumes add; mixing shrinks a mix
 * by less than it can be measured out).
 */
export function mixAmounts(mix: MixRatio, total: Total): Mixed<Amounts> {
	const wanted = 'litres' in total ? total.litres : total.kilograms;
	if (!(wanted >= 0 && Number.isFinite(wanted)))
		return unmixed({ code: 'outOfRange', field: 'total', found: wanted });
	const isVolume = mix.by === 'volume';
	const shares = mix.parts.map(({ name, share, density }) => ({
		name,
		litres: isVolume ? share : density === undefined ? null : share / density,
		kilograms: isVolume ? (density === undefined ? null : share * density) : share
	}));
	const unit = 'litres' in total ? 'litres' : 'kilograms';
	const whole = sumOf(shares.map((it) => it[unit]));
	if (whole === null) {
		const part = shares.find((it) => it[unit] === null)?.name ?? '';
		return unmixed({ code: 'densityMissing', part });
	}
	const scaled = (value: number | null): number | null =>
		value === null ? null : (value * wanted) / whole;
	const parts = shares.map(({ name, litres, kilograms }) => ({
		name,
		litres: scaled(litres),
		kilograms: scaled(kilograms)
	}));
	return mixed({
		parts,
		litres: sumOf(parts.map((it) => it.litres)),
		kilograms: sumOf(parts.map((it) => it.kilograms))
	});
}
