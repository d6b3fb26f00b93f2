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
} from './outlook/face/face';
export { leeSchema, leeSectorSchema, type LeeSector } from './outlook/face/lee';
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
} from './outlook/weather/forecast';
export {
	hourOfDaySchema,
	looseSandSchema,
	siteSchema,
	workHoursSchema,
	type LooseSand,
	type Site,
	type WorkHours
} from './outlook/weather/site';
export {
	SLOT_SECONDS,
	type FaceConditions,
	type SlotGrid,
	type SlotWeather
} from './outlook/weather/slots';
export { isNoisy } from './outlook/hours/noise';
export {
	closedSpansSchema,
	stepSchema,
	usualErrorsSchema,
	type ClosedSpans,
	type Step,
	type UsualErrors
} from './outlook/hours/step';
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
} from './outlook/hours/result';

export { cureClock, finishPosition, finishSlots, type CureClock } from './coating/cure';
export { minutesAt, type ClockSide } from './coating/curve';
export { MATERIAL_DEFAULTS, RUN_OFF_DEPTH, WET_FILM } from './met/materials';
export { addDays, localDate, localDays, nights, type LocalDay } from './outlook/weather/calendar';
export { faceConditions } from './outlook/face/conditions';
export { DEFAULT_USUAL_ERRORS } from './outlook/hours/errors';
export { flagBit, flagNames } from './outlook/weather/flags';
export { slotReading } from './outlook/hours/reading';
export { SHELTER_FACTORS } from './outlook/face/shelter';
export {
	durationSlotsOf,
	ENGINE_VERSION,
	runsOf,
	stepHours,
	type HoursOptions,
	type HoursRun
} from './outlook/hours/stepHours';
export {
	missingVariables,
	slotGrid,
	slotWeather,
	standardPressure,
	VARIABLE
} from './outlook/weather/weather';
export {
	FACE_NAMES,
	FACE_ORIENTATIONS,
	faceAzimuth,
	type FaceName
} from './outlook/face/orientation';
export { WET_HOUR } from './outlook/hours/roomSeries';
export { stretchesOf } from './outlook/hours/stretches';
export type { SlotStates } from './outlook/hours/judge';
export { workWind } from './outlook/hours/workWind';
export { instantText } from './outlook/weather/instant';
export { yardWeather, type YardWeather } from './outlook/weather/yardWeather';
export { surfaceReadingSchema, withReadings, type SurfaceReading } from './outlook/face/readings';
export { jobOutlook, type JobOptions, type JobOutlook } from './outlook/job/jobOutlook';
export { jobRemedies, type RemedyOptions } from './outlook/job/jobRemedies';
export type { FaceUnder, Job, JobStep } from './outlook/job/job';
export type { StepOutlook } from './outlook/job/stepOutlook';
export { WARNING_CODES, type Warning } from './outlook/job/warnings';
export type { LaunchReady, Plan, PlannedStep, Plans } from './outlook/plan/plan';
export {
	chosenLaunch,
	firstLaunch,
	launchWishSchema,
	slipOf,
	type LaunchWish,
	type Slip
} from './outlook/plan/launch';
export { brokenSteps, type BrokenStep } from './outlook/plan/broken';
export { latestFinishFor, nextBounds } from './outlook/plan/inverse';
export { placeInWindow, startWindow, type StartWindow } from './outlook/plan/window';
export { REMEDY_CODES, type Remedy, type RemedyCode } from './outlook/remedies/remedy';
export type { StepChances } from './outlook/members/chances';

export type {
	CoatingChain,
	CoatingFace,
	CoatingStep,
	Surface,
	Water
} from './coating/compatibility/chain';
export { compatibilityWarnings } from './coating/compatibility/compatibility';
export { primeWithin } from './coating/compatibility/primeWithin';
export type { CompatibilityRule } from './coating/compatibility/rule';
export { COMPATIBILITY_RULES } from './coating/compatibility/rules';
export type { CompatibilityCode, CompatibilityWarning } from './coating/compatibility/warnings';
export { HAZARDS, type Hazard } from './coating/hazards';
export {
	defaultWind,
	METHOD_WIND_LIMITS,
	windStops,
	type LayingMethod,
	type WindLimits
} from './coating/methodWind';
export { mixAmounts, type Amounts } from './coating/mix/amounts';
export { coverage, practicalSpread, thinnedSolids, wetFilmOf } from './coating/mix/coverage';
export { METHOD_LOSS } from './coating/mix/loss';
export type { Mixed, MixError } from './coating/mix/mixError';
export { mixPlan, type MixPlan, type MixRequest } from './coating/mix/mixPlan';
export { potTime, type PotTime } from './coating/mix/potTime';
export { COATING_TYPES, COATINGS, type CoatingType } from './coating/sheet/coatingTypes';
export {
	methodLimits,
	timesBefore,
	type MethodLimits,
	type NextCoat,
	type OvercoatSource
} from './coating/sheet/forStep';
export {
	checkedSheetSchema,
	checkSheet,
	readSheet,
	type SheetCheck,
	type SheetReading
} from './coating/sheet/check/readSheet';
export type { SheetFinding, SheetProblem, SheetWarning } from './coating/sheet/check/problem';
export { findingSentence } from './coating/sheet/check/sentence';
export type { MaximumPassed } from './coating/sheet/maximumPassed';
export { CONTENTS, sheetSchema, type Content, type Sheet } from './coating/sheet/sheet';
export { SUBSTRATES, type Substrate } from './coating/sheet/substrates';
export { SAMPLE_SHEETS, type SampleName } from './coating/samples/samples';
export { taskOf, TASKS, type TaskCode } from './coating/tasks/tasks';
export type { Task } from './coating/tasks/task';

export {
	FEW_READINGS,
	biasCorrection,
	ownUsualErrors,
	type BiasCorrection
} from './scoring/correction';
export {
	chanceScore,
	toldChanceSchema,
	type ChanceScore,
	type ReliabilityBin,
	type ToldChance
} from './scoring/chances';
export {
	forecastErrors,
	forecastPairSchema,
	SCORED_QUANTITIES,
	type ForecastErrors,
	type ForecastPair,
	type ScoredQuantity
} from './scoring/errors';
export { dryLiftGust } from './met/sand';
export { PLUME_REACH, type Place, type PlumeActivity } from './met/plume';
export {
	plumeConflicts,
	quietStart,
	type DustyWork,
	type ExposedWork,
	type PlumeConflict
} from './outlook/neighbours/conflicts';
export { strictVerdict, type StrictBand, type StrictVerdict } from './coating/strictWindow';
