import { describe, expect, test } from 'vitest';
import { minutesAt } from '../../../../../src/lib/engine/coating/curve';
import { SAMPLE_SHEETS } from '../../../../../src/lib/engine/coating/samples/samples';
import { rowsFrom } from '../../../../../src/lib/engine/coating/samples/rows';
import { COATINGS } from '../../../../../src/lib/engine/coating/sheet/coatingTypes';
import { sheetSchema, type Sheet } from '../../../../../src/lib/engine/coating/sheet/sheet';
import type { TimeTable } from '../../../../../src/lib/engine/coating/times';

const SAMPLES: readonly (readonly [string, Sheet])[] = Object.entries(SAMPLE_SHEETS);

/** Every table of a sheet, its own and toward each following coating, with a name. */
function tablesOf(sheet: Sheet): [string, TimeTable][] {
	const own = Object.entries(sheet.times).map(([name, table]): [string, TimeTable] => [
		name,
		table
	]);
	const pairs = Object.entries(sheet.following ?? {}).flatMap(([next, pair]) =>
		(['overcoatMin', 'overcoatMax'] as const).flatMap((name): [string, TimeTable][] =>
			pair[name] === undefined ? [] : [[`${name} of ${next}`, pair[name]]]
		)
	);
	return [...own, ...pairs];
}

test('rowsFrom steps by five degrees in the unit given', () => {
	expect(rowsFrom(10, 60, 8, 5.5)).toEqual([
		[10, 480],
		[15, 330]
	]);
});

describe('sample sheets', () => {
	test('there is one for every system the yard is likely to meet', () => {
		const types = new Set(SAMPLES.map(([, sheet]) => sheet.type));
		for (const type of [
			'epoxyPrimer',
			'aluminiumPrimer',
			'epoxyBarrier',
			'erodingAntifouling',
			'hardAntifouling',
			'etchPrimer',
			'siliconeTieCoat',
			'siliconeFinish',
			'polyurethaneTopcoat',
			'onePartEnamel',
			'varnish',
			'laminatingEpoxy',
			'polyurethaneSealant'
		] as const)
			expect(types).toContain(type);
		expect(new Set(SAMPLES.map(([, sheet]) => sheet.name)).size).toBe(SAMPLES.length);
	});

	test.each(SAMPLES)('%s is valid and says that it is a sample', (_, sheet) => {
		expect(sheetSchema.safeParse(sheet).error).toBeUndefined();
		expect(sheet.sample).toBe(true);
		expect(sheet.name).toContain('(sample)');
		expect(sheet.issuedOn).toBeUndefined();
	});

	test.each(SAMPLES)('%s takes no longer where it is warmer', (_, sheet) => {
		const tables = tablesOf(sheet);
		expect(tables.length).toBeGreaterThan(0);
		for (const [name, table] of tables) {
			if (table === null || typeof table === 'number') continue;
			table.forEach(([celsius, minutes], i) => {
				const before = table[i - 1]?.[1] ?? Infinity;
				expect(minutes, `${name} at ${celsius} °C`).toBeLessThanOrEqual(before);
			});
		}
	});

	test.each(SAMPLES)('%s is dry to the touch before the next coat and the water', (_, sheet) => {
		const { touchDry, keepDry, launchMin } = sheet.times;
		if (touchDry === undefined || touchDry === null) throw new Error('no touch dry');
		for (const celsius of [15, 20, 25, 30, 35]) {
			const dry = minutesAt(touchDry, celsius, 'earliest');
			if (keepDry !== undefined && keepDry !== null)
				expect(minutesAt(keepDry, celsius, 'earliest')).toBeGreaterThanOrEqual(dry);
			if (launchMin !== undefined && launchMin !== null)
				expect(minutesAt(launchMin, celsius, 'earliest')).toBeGreaterThan(dry);
		}
	});

	test.each(SAMPLES)('%s states the times that a plan needs of its kind', (_, sheet) => {
		for (const name of COATINGS[sheet.type].needs) expect(sheet.times[name]).toBeDefined();
	});

	test.each(SAMPLES)(
		'%s is measured by one film: solids, dry, wet and spread agree',
		(_, sheet) => {
			const { solids, dryFilm, wetFilm, spreadRate } = sheet.film ?? {};
			if (solids === undefined || dryFilm === undefined) {
				expect([wetFilm, spreadRate]).toEqual([undefined, undefined]);
				return;
			}
			expect((wetFilm ?? NaN) / ((dryFilm * 100) / solids)).toBeCloseTo(1, 1);
			expect((spreadRate ?? NaN) / ((solids * 10) / dryFilm)).toBeCloseTo(1, 1);
		}
	);

	test('copper paints do not name aluminium among what they may lie on', () => {
		const copper = SAMPLES.filter(([, sheet]) => sheet.contains?.includes('cuprousOxide'));
		expect(copper.map(([name]) => name)).toEqual(['erodingAntifouling', 'hardAntifouling']);
		for (const [, sheet] of copper) {
			expect(sheet.substrates).not.toContain('aluminium');
			expect(sheet.substrates).not.toContain('casting');
			expect(sheet.hazards[0]).toBe('biocide');
		}
	});

	test('what cures on the air’s moisture has a least humidity', () => {
		for (const [, sheet] of SAMPLES) {
			const { cure } = COATINGS[sheet.type];
			expect(sheet.limits.relativeHumidity?.min).toBe(
				cure === 'silicone' || cure === 'moisture' ? 30 : undefined
			);
		}
	});

	test('isocyanates are named on the polyurethanes', () => {
		expect(SAMPLE_SHEETS.polyurethaneTopcoat.hazards).toContain('isocyanate');
		expect(SAMPLE_SHEETS.polyurethaneSealant.hazards).toContain('isocyanate');
	});

	test('the etch primer is overcoated within minutes', () => {
		const { overcoatMin, overcoatMax } = SAMPLE_SHEETS.etchPrimer.times;
		if (overcoatMin === undefined || overcoatMax === undefined) throw new Error('no window');
		if (overcoatMin === null || overcoatMax === null) throw new Error('no window');
		expect(minutesAt(overcoatMin, 20, 'earliest')).toBeCloseTo(7, 9);
		expect(minutesAt(overcoatMax, 20, 'latest')).toBeCloseTo(25, 9);
	});
});
