import { ALOFT, COMMON_PRACTICE, DRY, windMost, type Task } from './task';

/** Mechanical and electrical work, ladders, masts and canvas, and the two coats that need no sheet. */
export const FITTING_TASKS = [
	{
		// Every opening covered and greased after; sand in a bearing is the risk.
		code: 'openSeals',
		kind: 'fit',
		method: 'none',
		limits: { rainFree: true, sand: 'none', ...windMost(6, 9) },
		hazards: ['solvent'],
		source: COMMON_PRACTICE
	},
	{
		code: 'electronics',
		kind: 'fit',
		method: 'none',
		limits: { rainFree: true, airTemperature: { min: 5 }, ...windMost(8, 12) },
		hazards: [],
		source: COMMON_PRACTICE
	},
	{
		code: 'mastStepping',
		kind: 'fit',
		method: 'none',
		limits: { ...ALOFT, daylight: true, ...windMost(7, 10) },
		hazards: ['suspendedLoad', 'height'],
		source: COMMON_PRACTICE
	},
	{
		code: 'ladderWork',
		kind: 'fit',
		method: 'none',
		limits: {
			...ALOFT,
			rainFree: true,
			daylight: true,
			airTemperature: { min: 2 },
			...windMost(8, 10)
		},
		caution: { wind: 6, gust: 8 },
		hazards: ['height'],
		source: 'gust: summaries of work at height, balance lost above about 23 mph; common practice'
	},
	{
		code: 'aerialPlatform',
		kind: 'fit',
		method: 'none',
		limits: { ...ALOFT, daylight: true, wind: { max: 12.5 }, gust: { max: 12.5 } },
		caution: { wind: 8 },
		hazards: ['height'],
		source: 'the usual rating of such machines, 28 mph; the machine’s own plate comes first'
	},
	{
		code: 'canvasFitting',
		kind: 'fit',
		method: 'none',
		limits: { ...windMost(6, 9) },
		hazards: ['height'],
		source: COMMON_PRACTICE
	},
	{
		code: 'varnishing',
		kind: 'coat',
		method: 'brush',
		limits: {
			...DRY,
			daylight: true,
			noDirectSun: true,
			sand: 'none',
			airTemperature: { min: 13, max: 24 },
			relativeHumidity: { min: 45, max: 65 },
			...windMost(4, 6)
		},
		hazards: ['oilyRags', 'solvent'],
		source:
			'13–24 °C and 65 %: a varnish sheet; 45 % and no wind: a chandlery’s advice; wind figures: common practice'
	},
	{
		code: 'lettering',
		kind: 'coat',
		method: 'brush',
		limits: {
			...DRY,
			daylight: true,
			sand: 'none',
			airTemperature: { min: 12, max: 28 },
			relativeHumidity: { max: 80 },
			...windMost(3, 5)
		},
		hazards: ['solvent'],
		source: COMMON_PRACTICE
	}
] as const satisfies readonly Task[];
