import { minutesAt, outsideRows, timeCurve } from '../curve';
import type { Sheet } from '../sheet/sheet';
import type { TimeTable } from '../times';
import { mixed, unmixed, type Mixed } from './mixError';

/** How long a mixed pot can be worked, minutes. */
export interface PotTime {
	/** Null: the tin sets none, or a one-part paint is silent about it. */
	readonly potLifeMinutes: number | null;
	/** To stand after mixing, taken from the pot life. */
	readonly inductionMinutes: number;
	/** Pot life less induction; null without a pot life. */
	readonly workMinutes: number | null;
	/** The temperature lies outside the rows that the tin states. */
	readonly extrapolated: boolean;
	/** So cold that the tin's times say nothing: the pot life is the coldest the tables reach to. */
	readonly standstill: boolean;
}

const isOutside = (table: TimeTable | undefined, celsius: number): boolean =>
	table !== undefined && table !== null && outsideRows(timeCurve(table), celsius);

/**
 * What the tin gives a pot at a temperature (°C, the paint's own).
 *
 * Pot life is a most, so outside the rows it takes the side of the latest clocks: hotter it goes on
 * shortening along the curve, colder it keeps the value 5 K past the rows. Induction is a least and
 * takes the side of the earliest: colder than that it never ends. The pot life includes the
 * induction (US Army TB 43-0144 on epoxy-polyamide).
 */
export function potTime(sheet: Sheet, celsius: number): Mixed<PotTime> {
	if (!Number.isFinite(celsius)) return unmixed({ code: 'temperatureUnknown' });
	const { potLife, induction } = sheet.times;
	if (potLife === undefined && (sheet.mix?.parts.length ?? 1) > 1)
		return unmixed({ code: 'potLifeSilent' });
	const inductionMinutes =
		induction === undefined || induction === null ? 0 : minutesAt(induction, celsius, 'earliest');
	if (!Number.isFinite(inductionMinutes))
		return unmixed({ code: 'standsStill', time: 'induction', celsius });
	const extrapolated = isOutside(potLife, celsius) || isOutside(induction, celsius);
	if (potLife === undefined || potLife === null)
		return mixed({
			potLifeMinutes: null,
			inductionMinutes,
			workMinutes: null,
			extrapolated,
			standstill: false
		});
	const potLifeMinutes = minutesAt(potLife, celsius, 'latest');
	const workMinutes = potLifeMinutes - inductionMinutes;
	if (!(workMinutes > 0)) return unmixed({ code: 'noTimeLeft', potLifeMinutes, inductionMinutes });
	const standstill = minutesAt(potLife, celsius, 'earliest') === Infinity;
	return mixed({ potLifeMinutes, inductionMinutes, workMinutes, extrapolated, standstill });
}
