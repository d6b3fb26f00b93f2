import { expect, test } from 'vitest';
import { hoursSchema } from '../../../../src/lib/api/hours';
import { hoursFixture } from '../../../fixtures/hours';

const page = hoursFixture();

test('the fixture is a page as the API gives it', () => {
	expect(hoursSchema.parse(page)).toEqual(page);
});

test('the runs of every step of the fixture cover the axis without gap or overlap', () => {
	for (const step of page.boats.flatMap((boat) => boat.steps)) {
		const edges = step.runs.map((run) => [run.from, run.to]);
		expect(edges[0][0]).toBe(0);
		expect(edges.at(-1)?.[1]).toBe(page.slotCount);
		edges.slice(1).forEach(([from], i) => expect(from).toBe(edges[i][1]));
		expect(step.bestByDay).toHaveLength(page.days.length);
	}
});

test('every band of the fixture has one value a slot', () => {
	const { airTemperature, dewPoint, windSpeed, windGust, windDirection, hourlyPrecipitation } =
		page.bands;
	for (const band of [
		airTemperature,
		dewPoint,
		windSpeed,
		windGust,
		windDirection,
		hourlyPrecipitation
	]) {
		expect(band).toHaveLength(page.slotCount);
	}
});
