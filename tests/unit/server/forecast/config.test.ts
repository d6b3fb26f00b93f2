import { describe, expect, it } from 'vitest';
import { forecastConfigSchema } from '../../../../src/lib/server/forecast/config';
import { userAgent } from '../../../../src/lib/server/forecast/userAgent';

describe('forecastConfigSchema', () => {
	it('asks the public services unless told otherwise', () => {
		expect(forecastConfigSchema.parse({})).toEqual({
			OPEN_METEO_URL: 'https://api.open-meteo.com',
			OPEN_METEO_ENSEMBLE_URL: 'https://ensemble-api.open-meteo.com',
			OPEN_METEO_CUSTOMER_URL: 'https://customer-api.open-meteo.com',
			OPEN_METEO_CUSTOMER_ENSEMBLE_URL: 'https://customer-ensemble-api.open-meteo.com',
			OPEN_METEO_KEY: '',
			MET_NORWAY_URL: 'https://api.met.no',
			FORECAST_CONTACT: ''
		});
	});
	it.each(['api.met.no', 'ftp://api.met.no', ''])(
		'refuses %j as an address, naming the key',
		(value) => {
			const parsed = forecastConfigSchema.safeParse({ MET_NORWAY_URL: value });
			expect(parsed.error?.issues[0]).toMatchObject({
				path: ['MET_NORWAY_URL'],
				message: 'is not an http(s) address'
			});
		}
	);
});

describe('userAgent', () => {
	it('is name, version and contact', () => {
		expect(userAgent('harbour@yard.example')).toBe('Yardglass/0.1 harbour@yard.example');
	});
	it('leaves out what a header cannot hold', () => {
		expect(userAgent('Werft\r\nX-Evil: 1 ü@yard.example')).toBe(
			'Yardglass/0.1 WerftX-Evil: 1 @yard.example'
		);
	});
});
