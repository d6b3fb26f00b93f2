/** The engine's public face: the only import path for the rest of the house. */
export * from './vocabulary';
export { limitsSchema, type Limits } from './coating/limits';
export {
	timesSchema,
	timeTableSchema,
	TIME_NAMES,
	type TimeName,
	type Times,
	type TimeTable
} from './coating/times';
export {
	faceSchema,
	shelterFactorsSchema,
	shelterSchema,
	type Face,
	type Shelter,
	type ShelterFactors
} from './outlook/face';
export {
	forecastSchema,
	hourlySchema,
	HOURLY_RANGES,
	HOURLY_VARIABLES,
	memberSchema,
	type Forecast,
	type Hourly,
	type HourlyVariable,
	type Member
} from './outlook/forecast';
export {
	looseSandSchema,
	siteSchema,
	workHoursSchema,
	type LooseSand,
	type Site,
	type WorkHours
} from './outlook/site';
export {
	SLOT_SECONDS,
	type FaceConditions,
	type SlotGrid,
	type SlotWeather
} from './outlook/slots';
export { stepSchema, usualErrorsSchema, type Step, type UsualErrors } from './outlook/step';
export {
	LIMIT_NAMES,
	LIMIT_UNITS,
	ORIGINS,
	PHASES,
	type BestHours,
	type LimitName,
	type LimitReading,
	type LimitUnit,
	type Origin,
	type Phase,
	type SlotReading,
	type StepHours,
	type Stretch
} from './outlook/result';

export { cureClock, finishPosition, finishSlots, type CureClock } from './coating/cure';
export { minutesAt, type ClockSide } from './coating/curve';
export { MATERIAL_DEFAULTS, RUN_OFF_DEPTH, WET_FILM } from './met/materials';
export { localDate, localDays, nights, type LocalDay } from './outlook/calendar';
export { faceConditions } from './outlook/conditions';
export { DEFAULT_USUAL_ERRORS } from './outlook/errors';
export { flagBit, flagNames } from './outlook/flags';
export { slotReading } from './outlook/reading';
export { SHELTER_FACTORS } from './outlook/shelter';
export {
	durationSlotsOf,
	ENGINE_VERSION,
	runsOf,
	stepHours,
	type HoursOptions,
	type HoursRun
} from './outlook/stepHours';
export {
	missingVariables,
	slotGrid,
	slotWeather,
	standardPressure,
	VARIABLE
} from './outlook/weather';
export { FACE_NAMES, FACE_ORIENTATIONS, faceAzimuth, type FaceName } from './outlook/orientation';
export { WET_HOUR } from './outlook/roomSeries';
export { stretchesOf } from './outlook/stretches';
export type { SlotStates } from './outlook/judge';
export { workWind } from './outlook/rooms';
