import type { Handle } from '@sveltejs/kit';

/** The faces above the fold of every page, by the name of their file. */
const EVERYWHERE = [
	'atkinson-hyperlegible-next-latin-wght-normal',
	'barlow-condensed-latin-500-normal',
	'barlow-condensed-latin-600-normal'
];
/** Boats are named in italics. */
const WITH_BOATS = [...EVERYWHERE, 'barlow-condensed-latin-600-italic'];
/** Routes whose first screen names boats. */
const NAMES_BOATS = new Set<string | null>(['/[yard]']);

/**
 * Has the faces fetched beside the style sheet that asks for them, not after it: the first words
 * drawn are then in the face they stay in, and nothing moves when it comes.
 */
export const preload: Handle = ({ event, resolve }) => {
	const faces = NAMES_BOATS.has(event.route.id) ? WITH_BOATS : EVERYWHERE;
	return resolve(event, {
		preload: ({ type, path }) =>
			type === 'font'
				? path.endsWith('.woff2') && faces.some((face) => path.includes(`/${face}.`))
				: type === 'js' || type === 'css'
	});
};
