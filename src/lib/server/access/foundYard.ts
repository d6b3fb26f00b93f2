import { eq, like, or, sql } from 'drizzle-orm';
import { z } from 'zod';
import { siteSchema } from '../../engine';
import { inAccounts } from '../db/accountsWork';
import type { Database } from '../db/client';
import { memberships, users, yards } from '../db/schema';
import { laySamples } from '../sheets/samples';
import { foundLetter, knownLetter } from '../mail/letters';
import { post, type Writer } from '../mail/outbox';
import { createLink, followLink, linkPayload } from './links';

/** Founding a yard: its place, and its first manager. */

const { latitude, longitude, timeZone } = siteSchema.shape;
export const yardPlaceSchema = z.object({
	name: z.string().trim().min(2, 'Give the yard a name.').max(80, 'Use at most 80 characters.'),
	latitude,
	longitude,
	elevation: z.number().min(-450).max(6000),
	timeZone
});
export type YardPlace = z.infer<typeof yardPlaceSchema>;

export const founderSchema = z.object({
	name: z.string().trim().min(1, 'Type your name.').max(120, 'Use at most 120 characters.'),
	email: z.string().trim().toLowerCase().pipe(z.email('That is not an e-mail address.'))
});

/** What waits for a link to be followed: nothing in it opens anything. */
const pendingSchema = z.object({ place: yardPlaceSchema, email: founderSchema.shape.email });

/** Hours in which a mailed founding can be finished. */
const LINK_HOURS = 48;

/** First words of addresses that are pages of the product itself, or may become some. */
export const TAKEN_SLUGS: readonly string[] = [
	'api',
	'schemas',
	'join',
	'new',
	'you',
	'sign-in',
	'sign-out',
	'forgot',
	'reset',
	'found',
	'invitation',
	'clock'
];

/** A yard's name as a part of an address: "Marram Quay" is marram-quay. */
export function slugOf(name: string): string {
	const plain = name
		.normalize('NFKD')
		.replaceAll(/\p{Mark}/gu, '')
		.toLowerCase()
		.replaceAll(/[^a-z0-9]+/g, '-')
		.replaceAll(/^-+|-+$/g, '')
		.slice(0, 48);
	return plain === '' ? 'yard' : plain;
}

/** The slug of a name, with the first free number behind it where it is taken. */
async function freeSlug(db: Writer, name: string): Promise<string> {
	const base = slugOf(name);
	const rows = await db
		.select({ slug: yards.slug })
		.from(yards)
		.where(or(eq(yards.slug, base), like(yards.slug, `${base}-%`)));
	const used = new Set([...TAKEN_SLUGS, ...rows.map(({ slug }) => slug)]);
	if (!used.has(base)) return base;
	let number = 2;
	while (used.has(`${base}-${number}`)) number++;
	return `${base}-${number}`;
}

/** Working hours a new yard starts with; it draws its own in the settings. */
const FIRST_HOURS = [
	{ days: [1, 2, 3, 4, 5], from: '07:30', to: '18:00' },
	{ days: [6], from: '08:00', to: '13:00' }
];

/** Founds a yard by somebody who is signed in; returns its slug. */
export function foundYard(db: Database, place: YardPlace, managerId: string): Promise<string> {
	return inAccounts(db, (tx) => createYard(tx, place, managerId));
}

/** Makes a yard with its first manager; returns its slug. */
async function createYard(db: Writer, place: YardPlace, managerId: string): Promise<string> {
	const slug = await freeSlug(db, place.name);
	const [{ id }] = await db
		.insert(yards)
		.values({ ...place, slug, workHours: FIRST_HOURS })
		.returning({ id: yards.id });
	await db.insert(memberships).values({ yardId: id, userId: managerId, role: 'manager' });
	await laySamples(db, id);
	return slug;
}

/**
 * Takes a founding by somebody who is not signed in: a mail finishes it, and only who reads it
 * chooses the passphrase. The answer is the same whether the address has an account or not; its
 * holder's mail says which.
 *
 * @param origin - the product's address, for the link
 */
export function askToFound(
	db: Database,
	{ place, email, origin }: { place: YardPlace; email: string; origin: string }
): Promise<void> {
	return inAccounts(db, async (tx) => {
		const known = await tx
			.select({ id: users.id })
			.from(users)
			.where(sql`lower(${users.email}) = ${email}`);
		if (known.length > 0) {
			await post(tx, knownLetter(email, `${origin}/sign-in`));
			return;
		}
		const token = await createLink(tx, {
			kind: 'foundYard',
			payload: { place, email } satisfies z.infer<typeof pendingSchema>,
			hours: LINK_HOURS
		});
		await post(tx, foundLetter(email, place.name, `${origin}/found/${token}`));
	});
}

/** What a founding's page shows; null where its link is over. */
export async function foundingOf(
	db: Database,
	token: string
): Promise<{ readonly yard: string; readonly email: string } | null> {
	const pending = pendingSchema.safeParse(await linkPayload(db, token, 'foundYard'));
	return pending.success ? { yard: pending.data.place.name, email: pending.data.email } : null;
}

/** Finishes a founding by its mailed link: account, yard, membership at once. Null where the link is over. */
export function finishFounding(
	db: Database,
	token: string,
	{ name, passwordHash }: { readonly name: string; readonly passwordHash: string }
): Promise<{ userId: string; slug: string } | null> {
	return inAccounts(db, async (tx) => {
		const link = await followLink(tx, token, 'foundYard');
		const pending = pendingSchema.safeParse(link?.payload);
		if (!pending.success) return null;
		const { place, email } = pending.data;
		const [user] = await tx
			.insert(users)
			.values({ email, name, passwordHash })
			.onConflictDoNothing()
			.returning({ id: users.id });
		// Made by another link meanwhile: that account stands, and founds again when signed in.
		if (user === undefined) return null;
		return { userId: user.id, slug: await createYard(tx, place, user.id) };
	});
}
