import { COMMON_PRACTICE, DRY, windMost, type Task } from './task';

/** Laminating, gluing, sealing and welding. */
export const JOINING_TASKS = [
	{
		code: 'laminatingPolyester',
		kind: 'laminate',
		method: 'none',
		limits: {
			...DRY,
			daylight: true,
			noDirectSun: true,
			airTemperature: { min: 18, max: 25 },
			relativeHumidity: { min: 40, max: 80 },
			...windMost(5, 8)
		},
		hazards: ['peroxide', 'styrene'],
		source:
			'class rules for moulding shops of FRP ships: 18 °C at least, 40–80 % of humidity, no draught or direct sun; the rest common practice'
	},
	{
		code: 'gelcoatOutdoors',
		kind: 'laminate',
		method: 'brush',
		limits: {
			...DRY,
			daylight: true,
			noDirectSun: true,
			airTemperature: { min: 18, max: 25 },
			relativeHumidity: { min: 50, max: 75 },
			...windMost(3, 6)
		},
		hazards: ['peroxide', 'styrene'],
		source: 'an article on gelcoat outdoors (weak); wind: common practice'
	},
	{
		code: 'laminatingEpoxy',
		kind: 'laminate',
		method: 'none',
		limits: {
			...DRY,
			daylight: true,
			airTemperature: { min: 10, max: 30 },
			surfaceTemperature: { min: 10 },
			relativeHumidity: { max: 80 },
			...windMost(6, 10)
		},
		hazards: ['epoxy', 'dust'],
		source: COMMON_PRACTICE
	},
	{
		code: 'gluingEpoxy',
		kind: 'bond',
		method: 'none',
		limits: {
			...DRY,
			daylight: true,
			airTemperature: { min: 10, max: 30 },
			surfaceTemperature: { min: 10 },
			relativeHumidity: { max: 80 },
			...windMost(6, 10)
		},
		hazards: ['epoxy'],
		source: COMMON_PRACTICE
	},
	{
		// Cures on the air's moisture: too dry an air is a limit too. Joint dry and free of frost.
		code: 'sealing',
		kind: 'seal',
		method: 'none',
		limits: {
			...DRY,
			daylight: true,
			airTemperature: { min: 5, max: 35 },
			surfaceTemperature: { min: 2 },
			relativeHumidity: { min: 30, max: 85 },
			...windMost(8, 12)
		},
		hazards: ['isocyanate', 'solvent'],
		source: COMMON_PRACTICE
	},
	{
		code: 'gasShieldedWelding',
		kind: 'weld',
		method: 'none',
		limits: { ...DRY, airTemperature: { min: -18 }, ...windMost(2.2, 11) },
		caution: { wind: 1.5 },
		hazards: ['hotWork'],
		source:
			'AWS D1.1: above 5 mph at the weld a shelter is required, no welding on wet surfaces, none below −18 °C; gust of hot work: common practice'
	},
	{
		code: 'stickWelding',
		kind: 'weld',
		method: 'none',
		limits: { ...DRY, airTemperature: { min: -18 }, ...windMost(8, 11) },
		hazards: ['hotWork'],
		source: 'AWS D1.1 for wet and cold; wind, with that of any hot work: common practice'
	}
] as const satisfies readonly Task[];
