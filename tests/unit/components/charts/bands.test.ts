import { describe, expect, test } from 'vitest';
import { createAxis } from '../../../../src/lib/components/charts/axis';
import {
	collide,
	extremeLabels,
	rainLabels,
	type BandLabel
} from '../../../../src/lib/components/charts/bandLabels';
import { airScale, windScale } from '../../../../src/lib/components/charts/bandScale';
import { textWidth } from '../../../../src/lib/components/charts/textWidth';
import { USUAL_UNITS } from '../../../../src/lib/units/quantity';
import { hoursFixture } from '../../../fixtures/hours';

const hours = hoursFixture();
const axis = createAxis(hours, 12);
const american = { ...USUAL_UNITS, temperature: '°F', wind: 'mph' } as const;

describe('scales of the bands', () => {
	test('the warmest is highest and every value keeps inside', () => {
		const scale = airScale(hours.bands, USUAL_UNITS, 92);
		if (!scale) throw new Error('no scale');
		expect(scale.y(19)).toBeLessThan(scale.y(9));
		for (const value of hours.bands.airTemperature) {
			expect(scale.y(value ?? NaN)).toBeGreaterThanOrEqual(0);
			expect(scale.y(value ?? NaN)).toBeLessThanOrEqual(92);
		}
	});

	test('there are three scale lines at most, in the reader’s units', () => {
		const celsius = airScale(hours.bands, USUAL_UNITS, 92);
		const fahrenheit = airScale(hours.bands, american, 92);
		expect(celsius?.lines.length).toBeLessThanOrEqual(3);
		expect(celsius?.lines.map((it) => it.text)).toContain('15°');
		expect(fahrenheit?.lines.map((it) => it.text)).toContain('60°');
		expect(fahrenheit?.y(15)).toBeCloseTo(celsius?.y(15) ?? NaN, 6);
	});

	test('the limit lies inside the wind band even when no gust comes near it', () => {
		const calm = { ...hours.bands, windGust: hours.bands.windGust.map(() => 2) };
		const scale = windScale(calm, 12, USUAL_UNITS, 84);
		expect(scale?.y(12)).toBeGreaterThan(20);
		expect(scale?.y(0)).toBe(84);
	});

	test('a band of one value is drawn, and one of none is not', () => {
		const flat = { ...hours.bands, airTemperature: [8, 8], dewPoint: [8, 8] };
		expect(Number.isFinite(airScale(flat, USUAL_UNITS, 92)?.y(8))).toBe(true);
		const none = { ...hours.bands, airTemperature: [null], dewPoint: [null] };
		expect(airScale(none, USUAL_UNITS, 92)).toBeNull();
	});
});

describe('words on the bands', () => {
	const spell = { from: 300, to: 370, amount: 12 };

	test('rain is named after its blocks, and before them where the axis ends', () => {
		const [beforeIt] = rainLabels([spell], () => 'rain 03–13, 12 mm', axis, 13.5);
		expect(beforeIt.anchor).toBe('end');
		const [afterIt] = rainLabels([{ ...spell, from: 0, to: 40 }], () => 'rain', axis, 13.5);
		expect(afterIt).toEqual({ x: 40 * 3 + 6, y: 13.5, text: 'rain', anchor: 'start' });
	});

	test('a peak gives way to a word that already stands there', () => {
		const scale = airScale(hours.bands, USUAL_UNITS, 92);
		if (!scale) throw new Error('no scale');
		const free = extremeLabels(hours.bands.airTemperature, hours.days, axis, scale, 13.5, []);
		const taken: BandLabel = { ...free[0], x: free[0].x + 4 };
		const rest = extremeLabels(hours.bands.airTemperature, hours.days, axis, scale, 13.5, [taken]);
		expect(rest).toEqual(free.slice(1));
	});

	test('labels collide only where both ways overlap', () => {
		const label: BandLabel = { x: 100, y: 30, text: '19°', anchor: 'middle' };
		expect(collide(label, { ...label, x: 110 }, 13.5)).toBe(true);
		expect(collide(label, { ...label, x: 160 }, 13.5)).toBe(false);
		expect(collide(label, { ...label, y: 60 }, 13.5)).toBe(false);
	});
});

test('text is as wide as the browser sets it, to a hundredth of an em a letter', () => {
	// Measured in Chromium with the shipped font files at 1000 px, ten of each character.
	expect(textWidth('wind', 1000, 500)).toBeCloseTo(585 + 212 + 432 + 431, 6);
	expect(textWidth('09:45', 1000, 600)).toBeCloseTo(4 * 475 + 252, 6);
	expect(textWidth('no dew point', 1000, 500)).toBeGreaterThan(4400);
	expect(textWidth('É', 10, 500)).toBeGreaterThan(4);
});
