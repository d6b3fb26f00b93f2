import {
	SAMPLE_SHEETS,
	methodLimits,
	taskOf,
	type Job,
	type JobStep,
	type Step
} from '../../src/lib/engine';

/** A made-up yard of queued jobs: faces look every way, in every colour; every coat has a sample sheet. */

const WORK_HOURS = [{ days: [1, 2, 3, 4, 5, 6], from: '07:30', to: '18:30' }];
const COLOURS = [0.25, 0.4, 0.6, 0.9];

type SheetName = keyof typeof SAMPLE_SHEETS;

const coat = (name: SheetName, method: 'roller' | 'rollAndTip', minutes: number): Step => ({
	name,
	kind: 'coat',
	durationMinutes: minutes,
	method,
	workHours: WORK_HOURS,
	limits: methodLimits(SAMPLE_SHEETS[name], method).limits,
	times: SAMPLE_SHEETS[name].times
});
const sanding: Step = {
	name: 'sanding',
	kind: 'abrade',
	durationMinutes: 180,
	method: 'none',
	workHours: WORK_HOURS,
	limits: taskOf('drySanding').limits,
	times: {}
};

/** The usual queues, as long as the jobs of a yard are. */
const QUEUES: readonly (readonly Step[])[] = [
	[
		sanding,
		coat('epoxyBarrier', 'roller', 150),
		coat('epoxyBarrier', 'roller', 150),
		coat('erodingAntifouling', 'roller', 120)
	],
	[coat('erodingAntifouling', 'roller', 120), coat('erodingAntifouling', 'roller', 120)],
	[coat('polyurethaneTopcoat', 'rollAndTip', 240), coat('polyurethaneTopcoat', 'rollAndTip', 240)],
	[sanding, coat('varnish', 'rollAndTip', 90), coat('varnish', 'rollAndTip', 90)]
];

/** Jobs of a yard: about five steps on two faces each, of which the number is given. */
export function jobsOf(faces: number, steps: number): Job[] {
	const jobs: Job[] = [];
	let facesLeft = faces;
	let stepsLeft = steps;
	for (let boat = 0; facesLeft > 0; boat++) {
		const heading = (boat * 67) % 360;
		const sides = Array.from({ length: Math.min(2, facesLeft) }, (_, side) => ({
			id: `face ${side}`,
			face: {
				tilt: boat % 3 === 0 ? 95 : 125,
				azimuth: (heading + (side === 0 ? 270 : 90)) % 360,
				solarAbsorptance: COLOURS[boat % COLOURS.length],
				emissivity: 0.9,
				material: 'grp' as const
			},
			shelter: 'open' as const
		}));
		facesLeft -= sides.length;
		const wanted = Math.ceil(stepsLeft / Math.max(1, Math.ceil(facesLeft / 2) + 1));
		const queue = QUEUES[boat % QUEUES.length];
		const queued: JobStep[] = Array.from({ length: Math.min(wanted, stepsLeft) }, (_, i) => ({
			step: queue[Math.min(i, queue.length - 1)],
			faces: sides
		}));
		stepsLeft -= queued.length;
		jobs.push({ steps: queued, launch: { launchBy: 0 } });
	}
	return jobs;
}
