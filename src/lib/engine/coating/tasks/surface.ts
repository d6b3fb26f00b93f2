import { COMMON_PRACTICE, DRY, windMost, type Task } from './task';

const HOUR = 60;

/** Washing, sanding and blasting: what makes a face ready. */
export const SURFACE_TASKS = [
	{
		// At once after the haul, while growth is soft; the boat is wet for 4–24 h after.
		code: 'pressureWash',
		kind: 'wash',
		method: 'none',
		limits: { airTemperature: { min: 2 }, daylight: true, ...windMost(10, 14) },
		hazards: ['pressureWater', 'biocide'],
		source: COMMON_PRACTICE
	},
	{
		code: 'scraping',
		kind: 'strip',
		method: 'none',
		limits: { airTemperature: { min: 5 }, daylight: true, ...windMost(10, 13) },
		hazards: ['oldPaint', 'biocide'],
		source: COMMON_PRACTICE
	},
	{
		// Wants water, so rain does not stop it; the slurry is caught and the face washed again.
		code: 'wetSanding',
		kind: 'abrade',
		method: 'none',
		limits: { airTemperature: { min: 5 }, daylight: true, ...windMost(10, 13) },
		hazards: ['oldPaint', 'biocide'],
		source: COMMON_PRACTICE
	},
	{
		code: 'drySanding',
		kind: 'abrade',
		method: 'none',
		limits: { ...DRY, daylight: true, ...windMost(5, 8) },
		hazards: ['oldPaint', 'biocide', 'dust'],
		source: 'common practice; a boatyard’s rules stop it when any dust leaves the sheet'
	},
	{
		code: 'grinding',
		kind: 'abrade',
		method: 'none',
		limits: { ...DRY, daylight: true, relativeHumidity: { max: 80 }, ...windMost(5, 8) },
		hazards: ['oldPaint', 'dust'],
		source: COMMON_PRACTICE
	},
	{
		code: 'blasting',
		kind: 'blast',
		method: 'none',
		limits: {
			...DRY,
			daylight: true,
			airTemperature: { min: 5 },
			relativeHumidity: { max: 85 },
			spread: { min: 3 },
			...windMost(5, 8)
		},
		times: { coatWithin: 4 * HOUR },
		hazards: ['blastStream', 'oldPaint', 'dust'],
		source:
			'humidity and spread: ISO 8502-4 and ISO 12944-7 practice; primed within 4 h: UFGS 09971; wind: common practice'
	},
	{
		code: 'degreasing',
		kind: 'degrease',
		method: 'none',
		limits: { ...DRY, daylight: true, airTemperature: { min: 5 }, gust: { max: 13 } },
		hazards: ['solvent'],
		source: COMMON_PRACTICE
	}
] as const satisfies readonly Task[];
