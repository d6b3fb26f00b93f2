import { DrizzlePostgreSQLAdapter } from '@lucia-auth/adapter-drizzle';
import { createHash } from 'node:crypto';
import { and, desc, eq, gt, ne } from 'drizzle-orm';
import { Lucia, TimeSpan, type Adapter, type DatabaseSession } from 'lucia';
import { onBehalfOf, onDuty } from '../db/behalf';
import type { Database } from '../db/client';
import { sessions, users, type User } from '../db/schema';

/**
 * Sessions, and the only module that knows the session library: it is no longer developed, and
 * this is where another would take its place.
 */

export type SignedInUser = Pick<User, 'id' | 'email' | 'name' | 'windUnit' | 'temperatureUnit'>;
export interface Session {
	readonly id: string;
	readonly expiresAt: Date;
}

/** A cookie to set, with the attributes kit's `cookies.set` takes. */
export interface SessionCookie {
	readonly name: string;
	readonly value: string;
	readonly attributes: {
		path: string;
		httpOnly: true;
		sameSite: 'lax';
		secure: boolean;
		maxAge: number;
	};
}

/** A device unheard of for so long signs in again, and every device after so long in any case. */
const SESSION_DAYS = 30;
const MOST_DAYS = 90;
const DAY_MS = 86_400_000;
/** When a device was last heard of is kept to within minutes. */
const SEEN_MS = 5 * 60_000;

const hashed = (token: string): string => createHash('sha256').update(token).digest('hex');

/** Keeps only the hash of a token in the table, so that who reads the table cannot sign in. */
function hashingAdapter(inner: Adapter): Adapter {
	return {
		async getSessionAndUser(token) {
			const [session, user] = await inner.getSessionAndUser(hashed(token));
			return session === null || user === null ? [null, null] : [{ ...session, id: token }, user];
		},
		getUserSessions: (userId) => inner.getUserSessions(userId),
		setSession: (session: DatabaseSession) =>
			inner.setSession({ ...session, id: hashed(session.id) }),
		updateSessionExpiration: (token, expiresAt) =>
			inner.updateSessionExpiration(hashed(token), expiresAt),
		deleteSession: (token) => inner.deleteSession(hashed(token)),
		deleteUserSessions: (userId) => inner.deleteUserSessions(userId),
		deleteExpiredSessions: () => inner.deleteExpiredSessions()
	};
}

type Attributes = Omit<SignedInUser, 'id'>;
interface Device {
	readonly createdAt: Date;
	readonly lastSeenAt: Date;
	readonly userAgent: string | null;
}

declare module 'lucia' {
	interface Register {
		Lucia: ReturnType<typeof createLucia>;
		DatabaseUserAttributes: Attributes;
		DatabaseSessionAttributes: Device;
	}
}

function createLucia(db: Database, secure: boolean) {
	return new Lucia<Device, Attributes>(
		hashingAdapter(new DrizzlePostgreSQLAdapter(db, sessions, users)),
		{
			sessionExpiresIn: new TimeSpan(SESSION_DAYS, 'd'),
			sessionCookie: {
				name: 'yardglass-session',
				attributes: { secure, sameSite: 'lax', path: '/' }
			},
			getSessionAttributes: ({ createdAt, lastSeenAt, userAgent }) => ({
				createdAt,
				lastSeenAt,
				userAgent
			}),
			getUserAttributes: ({ email, name, windUnit, temperatureUnit }) => ({
				email,
				name,
				windUnit,
				temperatureUnit
			})
		}
	);
}

export type Sessions = ReturnType<typeof createSessions>;

/** Sessions kept in a database. `secure` cookies are for https origins. */
export function createSessions(db: Database, { secure }: { secure: boolean }) {
	const lucia = createLucia(db, secure);
	const cookie = (value: string, maxAge: number): SessionCookie => ({
		name: lucia.sessionCookieName,
		value,
		attributes: { path: '/', httpOnly: true, sameSite: 'lax', secure, maxAge }
	});
	return {
		cookieName: lucia.sessionCookieName,
		/** Signs a user in; the cookie carries the only copy of the token. */
		async create(userId: string, userAgent: string | null = null): Promise<SessionCookie> {
			const now = new Date();
			const device = {
				createdAt: now,
				lastSeenAt: now,
				userAgent: userAgent?.slice(0, 400) ?? null
			};
			const session = await onDuty('accounts', () => lucia.createSession(userId, device));
			return cookie(session.id, SESSION_DAYS * 86_400);
		},
		/**
		 * The user of a token, or both null. `renewed` is the cookie to set again when the session's
		 * end was moved on.
		 */
		async validate(
			token: string
		): Promise<
			| { user: SignedInUser; session: Session; renewed: SessionCookie | null }
			| { user: null; session: null; renewed: null }
		> {
			const { user, session } = await onDuty('accounts', () => lucia.validateSession(token));
			if (user === null) return { user: null, session: null, renewed: null };
			const now = Date.now();
			if (now - session.createdAt.getTime() > MOST_DAYS * DAY_MS) {
				await this.end(token);
				return { user: null, session: null, renewed: null };
			}
			if (now - session.lastSeenAt.getTime() > SEEN_MS)
				await onDuty('accounts', () =>
					db
						.update(sessions)
						.set({ lastSeenAt: new Date(now) })
						.where(eq(sessions.id, hashed(token)))
				);
			return {
				user,
				session: { id: session.id, expiresAt: session.expiresAt },
				renewed: session.fresh ? cookie(session.id, SESSION_DAYS * 86_400) : null
			};
		},
		/** The devices a person is signed in on, the last heard of first; `token` marks this one. */
		async devicesOf(userId: string, token: string | null) {
			const rows = await onBehalfOf(userId, () =>
				db
					.select({
						id: sessions.id,
						createdAt: sessions.createdAt,
						lastSeenAt: sessions.lastSeenAt,
						userAgent: sessions.userAgent
					})
					.from(sessions)
					.where(and(eq(sessions.userId, userId), gt(sessions.expiresAt, new Date())))
					.orderBy(desc(sessions.lastSeenAt))
			);
			const own = token === null ? null : hashed(token);
			return rows.map((row) => ({ ...row, isThis: row.id === own }));
		},
		/** Ends one of a person's sessions by the id that their list shows. */
		async endDevice(userId: string, id: string): Promise<void> {
			await onBehalfOf(userId, () =>
				db.delete(sessions).where(and(eq(sessions.userId, userId), eq(sessions.id, id)))
			);
		},
		/** Ends every session of a person but the one of a token. */
		async endOthers(userId: string, token: string): Promise<void> {
			await onBehalfOf(userId, () =>
				db.delete(sessions).where(and(eq(sessions.userId, userId), ne(sessions.id, hashed(token))))
			);
		},
		end: (token: string): Promise<void> => onDuty('accounts', () => lucia.invalidateSession(token)),
		endAllOf: (userId: string): Promise<void> =>
			onDuty('accounts', () => lucia.invalidateUserSessions(userId)),
		blankCookie: (): SessionCookie => cookie('', 0),
		deleteExpired: (): Promise<void> => lucia.deleteExpiredSessions()
	};
}
