import { resolve } from '$app/paths';

export interface Place {
	readonly word: string;
	readonly href: string;
	/** Whether the page shown is one of this place's. */
	readonly isHere: boolean;
}

/** The places of the yard, in the order of the day; the page shown lies in one of them. */
export function placesOf(yard: string, pathname: string): Place[] {
	const hours = resolve('/[yard]', { yard });
	const places = [
		{ word: 'Hours', href: hours },
		{ word: 'Boats', href: resolve('/[yard]/boats', { yard }) },
		{ word: 'Jobs', href: resolve('/[yard]/jobs', { yard }) },
		{ word: 'Ground', href: resolve('/[yard]/ground', { yard }) },
		{ word: 'Settings', href: resolve('/[yard]/settings', { yard }) }
	];
	return places.map((place) => ({
		...place,
		isHere:
			pathname === place.href || (place.href !== hours && pathname.startsWith(`${place.href}/`))
	}));
}
