import type { StepState } from '$lib/api/jobs';
import type { PlanAim } from '$lib/api/plans';
import type { Method, ShelterName, StepKind, TaskCode } from '$lib/engine';

/** What the button says that takes a step from one state to another. */
export function moveWords(from: StepState, to: StepState): string {
	if (to === 'queued') return from === 'dropped' ? 'Take it back' : 'Not begun after all';
	if (to === 'underWay') return from === 'curing' ? 'Not laid yet after all' : 'Begin';
	if (to === 'curing') return 'Brush down';
	return to === 'done' ? 'Done' : 'Drop';
}

export const AIM_WORDS: Readonly<Record<PlanAim, string>> = {
	soonest: 'Soonest',
	byDate: 'By the date',
	surest: 'Surest'
};

export const KIND_WORDS: Readonly<Record<StepKind, string>> = {
	wash: 'wash',
	strip: 'strip',
	abrade: 'abrade',
	blast: 'blast',
	degrease: 'degrease',
	laminate: 'laminate',
	bond: 'bond',
	seal: 'seal',
	weld: 'weld',
	fit: 'fit or shift',
	coat: 'coat',
	cure: 'let cure',
	lift: 'lift',
	launch: 'launch'
};

export const METHOD_WORDS: Readonly<Record<Method, string>> = {
	brush: 'brush',
	roller: 'roller',
	rollAndTip: 'roll and tip',
	hvlp: 'spray, low pressure',
	airSpray: 'spray, air',
	airless: 'spray, airless',
	none: 'nothing is laid'
};

export const SHELTER_WORDS: Readonly<Record<ShelterName, string>> = {
	open: 'nothing, in the open',
	lee: 'in the lee',
	tarp: 'a tarp',
	tent: 'a tent',
	heatedTent: 'a heated tent',
	shed: 'a shed'
};

export const TASK_WORDS: Readonly<Record<TaskCode, string>> = {
	pressureWash: 'pressure wash',
	scraping: 'scraping',
	wetSanding: 'wet sanding',
	drySanding: 'dry sanding',
	grinding: 'grinding',
	blasting: 'blasting',
	degreasing: 'degreasing',
	laminatingPolyester: 'laminating, polyester',
	laminatingEpoxy: 'laminating, epoxy',
	gelcoatOutdoors: 'gelcoat outdoors',
	gluingEpoxy: 'gluing, epoxy',
	sealing: 'sealing',
	gasShieldedWelding: 'welding, gas-shielded',
	stickWelding: 'welding, stick',
	openSeals: 'engine or drive with open seals',
	electronics: 'electronics',
	varnishing: 'varnishing',
	lettering: 'lettering',
	canvasFitting: 'canvas fitting',
	mastStepping: 'mast stepping',
	ladderWork: 'work from a ladder',
	aerialPlatform: 'work from a platform',
	haul: 'hauling',
	haulHighWindage: 'hauling, much windage',
	launch: 'launching',
	launchHighWindage: 'launching, much windage',
	shiftPads: 'shifting the stands’ pads'
};
