/** The parts used of packages that ship no types. */
declare module 'psychrolib' {
	const psychrolib: {
		SI: number;
		SetUnitSystem(system: number): void;
		GetTDewPointFromRelHum(celsius: number, relativeHumidity: number): number;
		GetTWetBulbFromRelHum(celsius: number, relativeHumidity: number, pascal: number): number;
	};
	export default psychrolib;
}

declare module 'solar-calculator' {
	/** Centuries since J2000 of a date. */
	export function century(date: Date): number;
	/** Minutes. */
	export function equationOfTime(century: number): number;
	/** Degrees. */
	export function declination(century: number): number;
}
