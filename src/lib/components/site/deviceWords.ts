/** Browsers and systems by a word of their user agent, the more particular first. */
const BROWSERS = [
	['Edg/', 'Edge'],
	['OPR/', 'Opera'],
	['Firefox/', 'Firefox'],
	['Chrome/', 'Chrome'],
	['Safari/', 'Safari']
] as const;
const SYSTEMS = [
	['Android', 'Android'],
	['iPhone', 'iPhone'],
	['iPad', 'iPad'],
	['Windows', 'Windows'],
	['Mac OS', 'Mac'],
	['Linux', 'Linux']
] as const;

/** A device as a person would know it: "Chrome on Android". */
export function deviceWords(userAgent: string | null): string {
	const find = (list: readonly (readonly [string, string])[]): string | undefined =>
		list.find(([mark]) => userAgent?.includes(mark) === true)?.[1];
	const browser = find(BROWSERS);
	const system = find(SYSTEMS);
	if (browser === undefined) return system ?? 'A device without a name';
	return system === undefined ? browser : `${browser} on ${system}`;
}
