import { and, asc, eq, gt, isNull, lt, or, sql } from 'drizzle-orm';
import type { NewToken, Scope } from '../../api/tokens';
import { onDuty } from '../db/behalf';
import type { Database } from '../db/client';
import { accessTokens, users, yards } from '../db/schema';
import { hashOfToken, newToken } from './links';
import { yardsOf } from './roles';
import type { SignedInUser } from './sessions';

/** Personal access tokens: shown once, kept as a hash, over by a day that was chosen. */

/** By which a token is known for one of this product, by people and by scanners of sources. */
const PREFIX = 'yg_';
/** When one was last used is kept to within minutes. */
const USED_WITHIN = sql`interval '5 minutes'`;
/** The most that somebody has at a time. */
const MOST_TOKENS = 50;

/** What a request's token lets it do. */
export interface UsedToken {
	readonly id: string;
	readonly scopes: readonly Scope[];
	/** Slug of the only yard it opens; null: all of the person's. */
	readonly yard: string | null;
}

export type TokenResult =
	| { readonly outcome: 'made'; readonly token: string }
	| { readonly outcome: 'refused'; readonly field: 'name' | 'yard'; readonly why: string };

/** Makes a token; what it returns is the only copy. */
export async function makeToken(
	db: Database,
	userId: string,
	{ name, scopes, yard, days }: NewToken
): Promise<TokenResult> {
	const of = yard === null ? null : (await yardsOf(db, userId)).find(({ slug }) => slug === yard);
	if (of === undefined)
		return { outcome: 'refused', field: 'yard', why: 'Choose a yard you belong to.' };
	const held = await tokensOf(db, userId);
	if (held.length >= MOST_TOKENS)
		return {
			outcome: 'refused',
			field: 'name',
			why: `You have ${MOST_TOKENS} tokens. Withdraw one before you make another.`
		};
	const token = PREFIX + newToken();
	await db.insert(accessTokens).values({
		userId,
		name,
		scopes: [...new Set(scopes)],
		ofYard: of?.id ?? null,
		tokenHash: hashOfToken(token),
		expiresAt: sql`now() + make_interval(days => ${days})`
	});
	return { outcome: 'made', token };
}

/** A person's tokens, the oldest first; those that are over too, until they are withdrawn. */
export function tokensOf(db: Database, userId: string) {
	return db
		.select({
			id: accessTokens.id,
			name: accessTokens.name,
			scopes: accessTokens.scopes,
			yard: yards.name,
			createdAt: accessTokens.createdAt,
			expiresAt: accessTokens.expiresAt,
			lastUsedAt: accessTokens.lastUsedAt
		})
		.from(accessTokens)
		.leftJoin(yards, eq(yards.id, accessTokens.ofYard))
		.where(eq(accessTokens.userId, userId))
		.orderBy(asc(accessTokens.createdAt));
}

/** Withdraws one of a person's tokens: from now on it opens nothing. */
export async function withdrawToken(db: Database, userId: string, id: string): Promise<void> {
	await db
		.delete(accessTokens)
		.where(and(eq(accessTokens.userId, userId), eq(accessTokens.id, id)));
}

/** Whose a token is and what it lets do; null for one that is not, or not any more. */
export async function useToken(
	db: Database,
	token: string
): Promise<{ readonly user: SignedInUser; readonly token: UsedToken } | null> {
	if (!token.startsWith(PREFIX)) return null;
	return onDuty('accounts', async () => {
		const [found] = await db
			.select({
				id: accessTokens.id,
				scopes: accessTokens.scopes,
				yard: yards.slug,
				user: {
					id: users.id,
					email: users.email,
					name: users.name,
					windUnit: users.windUnit,
					temperatureUnit: users.temperatureUnit
				}
			})
			.from(accessTokens)
			.innerJoin(users, eq(users.id, accessTokens.userId))
			.leftJoin(yards, eq(yards.id, accessTokens.ofYard))
			.where(
				and(eq(accessTokens.tokenHash, hashOfToken(token)), gt(accessTokens.expiresAt, sql`now()`))
			);
		if (found === undefined) return null;
		await db
			.update(accessTokens)
			.set({ lastUsedAt: sql`now()` })
			.where(
				and(
					eq(accessTokens.id, found.id),
					or(
						isNull(accessTokens.lastUsedAt),
						lt(accessTokens.lastUsedAt, sql`now() - ${USED_WITHIN}`)
					)
				)
			);
		const { user, ...used } = found;
		return { user, token: used };
	});
}
