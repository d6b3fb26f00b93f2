/** Where the weather is asked for. Degrees. */
export interface Place {
	latitude: number;
	longitude: number;
}

/**
 * The weather of one hour; null is missing. Temperature, dew point, pressure, wind, direction and
 * cloud are instants at the stamp; gust, rain and irradiance belong to the hour before it.
 */
export interface HourWeather {
	/** °C */
	temperature: number | null;
	/** °C */
	dewPoint: number | null;
	/** %, as the source gives it; it need not agree with the dew point of a measured hour. */
	relativeHumidity: number | null;
	/** hPa at sea level */
	seaLevelPressure: number | null;
	/** m/s at 10 m */
	windSpeed: number | null;
	/** m/s at 10 m, the highest of the hour */
	windGust: number | null;
	/** Degrees from north the wind comes from. */
	windDirection: number | null;
	/** mm */
	precipitation: number | null;
	/** % */
	precipitationProbability: number | null;
	/** % of sky */
	cloudCover: number | null;
	/** W/m², global horizontal */
	ghi: number | null;
	/** W/m², direct normal */
	dni: number | null;
	/** W/m², diffuse horizontal */
	dhi: number | null;
}

/** How a forecast differs from the weather it is a forecast of. */
export interface Nudge {
	/** K, added */
	temperature: number;
	/** K, added */
	dewPoint: number;
	/** Factor on mean wind and gust. */
	wind: number;
	/** Degrees, added. */
	direction: number;
	/** Points of per cent, added. */
	cloud: number;
	/** Factor on amounts. */
	rain: number;
	/** Seconds by which wind, cloud, rain and pressure come early (positive) or late. */
	early: number;
}

export const NO_NUDGE: Nudge = {
	temperature: 0,
	dewPoint: 0,
	wind: 1,
	direction: 0,
	cloud: 0,
	rain: 1,
	early: 0
};

/** A source of weather: made up or measured. */
export interface Weather {
	/** @param time - a whole hour, UTC epoch seconds */
	hour(time: number, place: Place, nudge: Nudge): HourWeather;
}
