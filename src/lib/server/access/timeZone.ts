import lookUp from '@photostructure/tz-lookup';

/** The IANA zone of a place, from its coordinates; UTC where the table knows none. */
export function timeZoneAt(latitude: number, longitude: number): string {
	try {
		return lookUp(latitude, longitude);
	} catch {
		return 'UTC';
	}
}
