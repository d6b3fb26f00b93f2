import type { Role } from '../db/schema';
import type { Letter } from './outbox';

/** The letters of accounts. Links hold their only token: nothing else in a letter opens anything. */

export const foundLetter = (to: string, yard: string, link: string): Letter => ({
	to,
	subject: `Open ${yard} on Yardglass`,
	paragraphs: [
		`Somebody, we hope you, founded the yard ${yard} on Yardglass with this address.`,
		{ words: 'Open the yard', link },
		'The link works once, for two days. If it was not you, do nothing: without it there is no yard and no account.'
	]
});

/** To somebody who has an account already and founded a yard as if they had none. */
export const knownLetter = (to: string, link: string): Letter => ({
	to,
	subject: 'You have a Yardglass account already',
	paragraphs: [
		'Somebody, we hope you, tried to found a yard with this address, which has an account already. Sign in first, then found the yard.',
		{ words: 'Sign in', link },
		'If it was not you, do nothing: nothing was changed.'
	]
});

export const resetLetter = (to: string, link: string): Letter => ({
	to,
	subject: 'A new passphrase for Yardglass',
	paragraphs: [
		'Somebody, we hope you, asked for a new passphrase for this address.',
		{ words: 'Choose a new passphrase', link },
		'The link works once, for two hours. If it was not you, do nothing: the old passphrase stays.'
	]
});

const AS: Record<Role, string> = {
	manager: 'a manager of the yard',
	painter: 'a painter',
	owner: 'the owner of a boat'
};

export const invitationLetter = (
	to: string,
	invitation: { yard: string; role: Role; by: string; boat: string | null },
	link: string
): Letter => ({
	to,
	subject: `${invitation.by} asks you to ${invitation.yard} on Yardglass`,
	paragraphs: [
		`${invitation.by} asks you to join ${invitation.yard} on Yardglass as ${AS[invitation.role]}${invitation.boat === null ? '' : `, to work on ${invitation.boat}`}.`,
		{ words: 'Join the yard', link },
		'The link works once, for two weeks. If you do not know them, do nothing.'
	]
});
