const MINUTES_PER_HOUR = 60;
const HOURS_PER_DAY = 24;

/** How old something is: "25 min", "9 h", "3 days". Rounded down. */
export function age(minutes: number): string {
	const whole = Math.max(0, Math.floor(minutes));
	if (whole < MINUTES_PER_HOUR) return `${whole} min`;
	const hours = Math.floor(whole / MINUTES_PER_HOUR);
	if (hours < 2 * HOURS_PER_DAY) return `${hours} h`;
	return `${Math.floor(hours / HOURS_PER_DAY)} days`;
}

/** How long something takes: "45 min", "2 h", "1 h 45". */
export function duration(minutes: number): string {
	const whole = Math.round(minutes);
	const hours = Math.floor(whole / MINUTES_PER_HOUR);
	const rest = whole % MINUTES_PER_HOUR;
	if (hours === 0) return `${rest} min`;
	return rest === 0 ? `${hours} h` : `${hours} h ${String(rest).padStart(2, '0')}`;
}
