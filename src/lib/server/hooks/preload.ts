import type { Handle } from '@sveltejs/kit';

/** The faces above the fold of every page, by the name of their file. */
const EVERYWHERE = [
	'atkinson-hyperlegible-next-latin-wght-normal',
	'barlow-condensed-latin-500-normal',
	'barlow-condensed-latin-600-normal'
];
/** A yard's pages name boats, and boats are in italics. */
const IN_A_YARD = ['barlow-condensed-latin-600-italic'];

/**
 * Has the faces fetched beside the style sheet that asks for them, not after it: the first words
 * drawn are then in the face they stay in, and nothing moves when it comes.
 */
export const preload: Handle = ({ event, resolve }) => {
	const inYard = event.route.id?.startsWith('/[yard]') ?? false;
	const faces = inYard ? [...EVERYWHERE, ...IN_A_YARD] : EVERYWHERE;
	return resolve(event, {
		preload: ({ type, path }) =>
			type === 'font'
				? path.endsWith('.woff2') && faces.some((face) => path.includes(`/${face}.`))
				: type === 'js' || type === 'css'
	});
};
