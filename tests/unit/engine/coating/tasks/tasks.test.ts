import { describe, expect, test } from 'vitest';
import { HAZARDS } from '../../../../../src/lib/engine/coating/hazards';
import { limitsSchema } from '../../../../../src/lib/engine/coating/limits';
import { timesSchema } from '../../../../../src/lib/engine/coating/times';
import { taskOf, TASKS, type TaskCode } from '../../../../../src/lib/engine/coating/tasks/tasks';
import { METHODS, STEP_KINDS } from '../../../../../src/lib/engine/vocabulary';

const limitsOf = (code: TaskCode) => {
	const task = taskOf(code);
	if (task === null) throw new Error(`no task ${code}`);
	return task.limits;
};

describe('TASKS', () => {
	test('covers the yard’s steps without a sheet, each once', () => {
		const codes = TASKS.map((task) => task.code);
		expect(new Set(codes).size).toBe(codes.length);
		expect(codes).toEqual(
			expect.arrayContaining([
				'pressureWash',
				'wetSanding',
				'drySanding',
				'blasting',
				'laminatingPolyester',
				'laminatingEpoxy',
				'gluingEpoxy',
				'sealing',
				'gasShieldedWelding',
				'stickWelding',
				'openSeals',
				'varnishing',
				'mastStepping',
				'haul',
				'haulHighWindage',
				'launch',
				'launchHighWindage',
				'ladderWork',
				'canvasFitting'
			])
		);
	});

	test('only the yard’s own people shift the pads of a stand', () => {
		expect(TASKS.filter(({ isYardOnly }) => isYardOnly).map(({ code }) => code)).toEqual([
			'shiftPads'
		]);
	});

	test.each(TASKS.map((task) => [task.code, task] as const))(
		'%s is a valid rule of the engine’s own words',
		(_, task) => {
			expect(limitsSchema.safeParse(task.limits).error).toBeUndefined();
			expect(timesSchema.safeParse(task.times ?? {}).error).toBeUndefined();
			expect(STEP_KINDS).toContain(task.kind);
			expect(METHODS).toContain(task.method);
			for (const hazard of task.hazards) expect(HAZARDS).toContain(hazard);
			expect(task.source.length).toBeGreaterThan(10);
		}
	);

	test.each(TASKS.map((task) => [task.code, task] as const))(
		'%s names its hazards worst first and stops in some wind',
		(_, task) => {
			const order = task.hazards.map((hazard) => HAZARDS.indexOf(hazard));
			expect(order).toEqual([...order].sort((a, b) => a - b));
			const { wind, gust } = task.limits;
			expect(wind ?? gust).toBeDefined();
			if (wind !== undefined && gust !== undefined) expect(wind.max).toBeLessThanOrEqual(gust.max);
		}
	);

	test('a caution comes before the stop', () => {
		const careful = TASKS.filter((task) => task.caution !== undefined);
		expect(careful.length).toBeGreaterThanOrEqual(5);
		for (const { caution, limits } of careful) {
			if (caution?.wind !== undefined)
				expect(caution.wind).toBeLessThan(limits.wind?.max ?? Infinity);
			if (caution?.gust !== undefined)
				expect(caution.gust).toBeLessThan(limits.gust?.max ?? Infinity);
		}
	});

	test('every task that can hurt bystanders, eyes or lungs names a hazard', () => {
		expect(TASKS.filter((task) => task.hazards.length === 0).map((task) => task.code)).toEqual([
			'electronics'
		]);
	});
});

describe('the rules themselves', () => {
	test('rain stops dry sanding and not wet sanding', () => {
		expect(limitsOf('drySanding')).toMatchObject({ rainFree: true, drySurface: true });
		expect(limitsOf('wetSanding').rainFree).toBeUndefined();
		expect(limitsOf('wetSanding').drySurface).toBeUndefined();
	});

	test('dry sanding stops in less wind than wet sanding', () => {
		expect(limitsOf('drySanding')).toMatchObject({ wind: { max: 5 }, gust: { max: 8 } });
		expect(limitsOf('wetSanding')).toMatchObject({ wind: { max: 10 }, gust: { max: 13 } });
	});

	test('a pressure wash minds neither rain nor a wet face', () => {
		const { rainFree, drySurface, airTemperature } = limitsOf('pressureWash');
		expect([rainFree, drySurface]).toEqual([undefined, undefined]);
		expect(airTemperature).toEqual({ min: 2 });
	});

	test('blasted metal is to be coated within four hours', () => {
		expect(taskOf('blasting')?.times).toEqual({ coatWithin: 240 });
		expect(limitsOf('blasting')).toMatchObject({
			spread: { min: 3 },
			relativeHumidity: { max: 85 }
		});
	});

	test('polyester wants warmth within narrow bounds and no sun, epoxy less so', () => {
		expect(limitsOf('laminatingPolyester')).toMatchObject({
			airTemperature: { min: 18, max: 25 },
			relativeHumidity: { min: 40, max: 80 },
			noDirectSun: true
		});
		expect(limitsOf('laminatingEpoxy')).toMatchObject({ airTemperature: { min: 10, max: 30 } });
	});

	test('a gas shield is blown away by a wind that stick welding takes', () => {
		expect(limitsOf('gasShieldedWelding').wind).toEqual({ max: 2.2 });
		expect(limitsOf('stickWelding').wind).toEqual({ max: 8 });
		expect(limitsOf('gasShieldedWelding').rainFree).toBe(true);
	});

	test('open bearings and seals want no sand', () => {
		expect(limitsOf('openSeals').sand).toBe('none');
	});

	test('hoists, masts and ladders are judged at ten metres, brushes at two', () => {
		for (const code of ['haul', 'launch', 'mastStepping', 'ladderWork'] as const)
			expect(limitsOf(code).windHeight).toBe(10);
		expect(limitsOf('drySanding').windHeight).toBeUndefined();
	});

	test('a boat of high windage stays on the ground in less wind', () => {
		expect(limitsOf('haul')).toMatchObject({ wind: { max: 9 }, gust: { max: 12 } });
		expect(limitsOf('haulHighWindage')).toMatchObject({ wind: { max: 7 }, gust: { max: 10 } });
		expect(limitsOf('launchHighWindage')).toEqual(limitsOf('haulHighWindage'));
		expect(taskOf('launch')?.kind).toBe('launch');
		expect(taskOf('haul')?.kind).toBe('lift');
	});

	test('a code that nobody knows is nothing', () => {
		expect(taskOf('scrubbing')).toBeNull();
	});
});
