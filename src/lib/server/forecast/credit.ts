import type { ProviderName } from '../db/schema';

/** How a provider is named and credited, and what its terms say of use. */
export interface Credit {
	/** As a person would name it. */
	label: string;
	/** Shown, with the link, beside whatever was made from its data. */
	attribution: { text: string; url: string };
	/** What free use allows and what other use would need, in sentences. */
	terms: string;
}

/**
 * Both services license their data under CC BY 4.0, which asks for credit, a link to the licence
 * and a word on changes. The wording follows their own pages: Open-Meteo's licence page asks for
 * the link "Weather data by Open-Meteo.com" next to any place its data are shown; MET Norway's
 * licensing page suggests "Based on data from MET Norway".
 */
export const CREDITS: Record<ProviderName, Credit> = {
	'open-meteo': {
		label: 'Open-Meteo',
		attribution: {
			text: 'Weather data by Open-Meteo.com (CC BY 4.0), adapted to your boats',
			url: 'https://open-meteo.com/'
		},
		terms:
			'The free service is for non-commercial use, under 10 000 calls a day; a large request counts as several. A yard that works for money needs a paid plan with its own address and key, or a service of its own.'
	},
	'met-norway': {
		label: 'MET Norway',
		attribution: {
			text: 'Based on data from MET Norway (CC BY 4.0), adapted to your boats',
			url: 'https://www.met.no/en/free-meteorological-data/Licensing-and-crediting'
		},
		terms:
			'Free for any use with credit, an identifying contact address and fewer than 20 requests a second; there is no paid service and no guarantee.'
	}
};
