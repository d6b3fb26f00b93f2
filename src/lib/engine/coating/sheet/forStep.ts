import type { Method } from '../../vocabulary';
import type { Limits } from '../limits';
import { defaultWind } from '../methodWind';
import type { Times } from '../times';
import type { CoatingType } from './coatingTypes';
import type { MaximumPassed } from './maximumPassed';
import type { Sheet } from './sheet';

export interface MethodLimits {
	readonly limits: Limits;
	/** Wind limits that no sheet states, taken from the defaults of the method and the coating. */
	readonly defaults: readonly ('wind' | 'gust')[];
}

/**
 * The limits of a sheet for a step laid by a method. Most wind: the sheet's word for the method,
 * else its word for any, else the default of method and coating, named as such.
 */
export function methodLimits(sheet: Sheet, method: Method): MethodLimits {
	const own = method === 'none' ? undefined : sheet.wind?.[method];
	const usual = defaultWind(method, sheet.type);
	const wind = own?.wind ?? sheet.limits.wind?.max;
	const gust = own?.gust ?? sheet.limits.gust?.max;
	const windMost = wind ?? usual?.stop;
	const gustMost = gust ?? usual?.gust;
	const defaults: MethodLimits['defaults'] = [
		...(wind === undefined && windMost !== undefined ? (['wind'] as const) : []),
		...(gust === undefined && gustMost !== undefined ? (['gust'] as const) : [])
	];
	const limits = { ...sheet.limits };
	if (windMost !== undefined) limits.wind = { max: windMost };
	if (gustMost !== undefined) limits.gust = { max: gustMost };
	return { limits, defaults };
}

/** Where an overcoat time comes from: the tin's word for that pair, its word for any, or nowhere. */
export type OvercoatSource = 'pair' | 'any' | 'silent';

export interface NextCoat {
	/** The sheet's times, overcoat minimum and maximum toward the next coat. */
	readonly times: Times;
	readonly overcoatMin: OvercoatSource;
	readonly overcoatMax: OvercoatSource;
	readonly whenMaximumPassed: MaximumPassed | null;
}

const sourceOf = (pair: unknown, any: unknown): OvercoatSource =>
	pair !== undefined ? 'pair' : any !== undefined ? 'any' : 'silent';

/**
 * The times of a coat before a next one of a kind. A sheet has one minimum and maximum per
 * following coating; where it has none for the pair, its general one holds and is named so.
 *
 * @param next - kind of the next coat; null where none follows or its kind is not known
 */
export function timesBefore(sheet: Sheet, next: CoatingType | null): NextCoat {
	const pair = next === null ? undefined : sheet.following?.[next];
	const times = { ...sheet.times };
	if (pair?.overcoatMin !== undefined) times.overcoatMin = pair.overcoatMin;
	if (pair?.overcoatMax !== undefined) times.overcoatMax = pair.overcoatMax;
	return {
		times,
		overcoatMin: sourceOf(pair?.overcoatMin, sheet.times.overcoatMin),
		overcoatMax: sourceOf(pair?.overcoatMax, sheet.times.overcoatMax),
		whenMaximumPassed: pair?.whenMaximumPassed ?? sheet.whenMaximumPassed ?? null
	};
}
