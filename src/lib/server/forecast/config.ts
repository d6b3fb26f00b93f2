import { z } from 'zod';

const httpUrl = z.url({ protocol: /^https?$/, error: 'is not an http(s) address' });

/**
 * Where forecasts come from. The defaults are the public services; a paid or self-hosted service
 * speaks the same formats at another address.
 */
export const forecastConfigSchema = z.object({
	/** Open-Meteo's forecast service, without the path. */
	OPEN_METEO_URL: httpUrl.default('https://api.open-meteo.com'),
	/** Open-Meteo's ensemble service, without the path. */
	OPEN_METEO_ENSEMBLE_URL: httpUrl.default('https://ensemble-api.open-meteo.com'),
	/** Open-Meteo's key of a paid plan; empty for the free service. */
	OPEN_METEO_KEY: z.string().trim().max(200).default(''),
	/** Where a yard's own key of a paid plan is good, without the path: forecast and ensemble. */
	OPEN_METEO_CUSTOMER_URL: httpUrl.default('https://customer-api.open-meteo.com'),
	OPEN_METEO_CUSTOMER_ENSEMBLE_URL: httpUrl.default('https://customer-ensemble-api.open-meteo.com'),
	/** MET Norway's Weather API, without the path. */
	MET_NORWAY_URL: httpUrl.default('https://api.met.no'),
	/**
	 * An e-mail address or a web page at which whoever runs this installation can be reached. Sent
	 * with every request; MET Norway's terms ask for it and it is not asked without one.
	 */
	FORECAST_CONTACT: z.string().trim().max(200).default('')
});
export type ForecastConfig = z.infer<typeof forecastConfigSchema>;
