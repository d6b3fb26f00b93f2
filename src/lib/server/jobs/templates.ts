import type { FaceName, Method, SampleName, StepKind, TaskCode } from '../../engine';

/** A step of a usual job. Hours are a start (default, no source): its people know better. */
export interface TemplateStep {
	readonly name: string;
	readonly kind: StepKind;
	readonly method: Method;
	readonly hours: number;
	readonly sheet?: SampleName;
	readonly task?: TaskCode;
}

/** A usual job of a yard: its steps in order, all on the same faces. */
export interface JobTemplate {
	readonly code: string;
	readonly name: string;
	readonly faces: readonly FaceName[];
	readonly steps: readonly TemplateStep[];
}

const coat = (name: string, sheet: SampleName, method: Method, hours: number): TemplateStep => ({
	name,
	kind: 'coat',
	method,
	hours,
	sheet
});
const work = (name: string, kind: StepKind, hours: number, task?: TaskCode): TemplateStep => ({
	name,
	kind,
	method: 'none',
	hours,
	...(task === undefined ? {} : { task })
});

/** The usual jobs, with generic coatings whose sheets are samples to be checked against the tin. Common practice. */
export const JOB_TEMPLATES = [
	{
		code: 'antifoulSeason',
		name: 'Antifouling for the season',
		faces: ['bottom'],
		steps: [
			work('wash the bottom', 'wash', 1.5, 'pressureWash'),
			work('wet sand', 'abrade', 3, 'wetSanding'),
			coat('antifouling 1', 'erodingAntifouling', 'roller', 1.5),
			coat('antifouling 2', 'erodingAntifouling', 'roller', 1.5)
		]
	},
	{
		code: 'runningGear',
		name: 'Drive leg and propeller',
		faces: ['driveLeg', 'propeller'],
		steps: [
			work('sand to bright metal', 'abrade', 2, 'drySanding'),
			coat('etch primer', 'etchPrimer', 'brush', 0.25),
			coat('silicone clear', 'runningGearSilicone', 'brush', 0.25)
		]
	},
	{
		code: 'topsidesRespray',
		name: 'Topsides respray',
		faces: ['topsides'],
		steps: [
			work('wash the topsides', 'wash', 1, 'pressureWash'),
			work('sand', 'abrade', 4, 'drySanding'),
			work('degrease and tack off', 'degrease', 1),
			coat('topcoat 1', 'polyurethaneTopcoat', 'hvlp', 1.5),
			coat('topcoat 2', 'polyurethaneTopcoat', 'hvlp', 1.5)
		]
	},
	{
		code: 'barrierCoat',
		name: 'New barrier coat',
		faces: ['bottom'],
		steps: [
			work('sand', 'abrade', 4, 'drySanding'),
			work('wash and degrease', 'degrease', 1),
			coat('barrier coat 1', 'epoxyBarrier', 'roller', 2),
			coat('barrier coat 2', 'epoxyBarrier', 'roller', 2),
			coat('barrier coat 3', 'epoxyBarrier', 'roller', 2),
			coat('barrier coat 4', 'epoxyBarrier', 'roller', 2),
			coat('antifouling 1', 'erodingAntifouling', 'roller', 1.5),
			coat('antifouling 2', 'erodingAntifouling', 'roller', 1.5)
		]
	},
	{
		code: 'varnish',
		name: 'Varnish',
		faces: ['coachroof'],
		steps: [
			work('sand', 'abrade', 2, 'drySanding'),
			coat('varnish 1', 'varnish', 'brush', 1.5),
			coat('varnish 2', 'varnish', 'brush', 1.5),
			coat('varnish 3', 'varnish', 'brush', 1.5)
		]
	}
] as const satisfies JobTemplate[];
export type TemplateCode = (typeof JOB_TEMPLATES)[number]['code'];

export function templateOf(code: string): JobTemplate | null {
	return JOB_TEMPLATES.find((template) => template.code === code) ?? null;
}
