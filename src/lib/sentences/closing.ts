import type { Limiter } from '../engine';
import { capital, LIMITER_WORDS } from './words';

/** Limiters that say nothing of the weather: the day's own ends. */
const OF_COURSE: readonly Limiter[] = ['none', 'hours', 'dark'];

/** What shuts a stretch on either side: "Dew shuts it before, wind after." Empty where only the day does. */
export function closing(before: Limiter, after: Limiter): string {
	const early = OF_COURSE.includes(before) ? null : LIMITER_WORDS[before];
	const late = OF_COURSE.includes(after) ? null : LIMITER_WORDS[after];
	if (early !== null && early === late) return `${capital(early)} shuts it before and after.`;
	if (early !== null && late !== null) return `${capital(early)} shuts it before, ${late} after.`;
	if (early !== null) return `${capital(early)} shuts it before.`;
	if (late !== null) return `${capital(late)} shuts it after.`;
	return '';
}
