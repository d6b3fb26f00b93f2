import { DrizzlePostgreSQLAdapter } from '@lucia-auth/adapter-drizzle';
import { createHash } from 'node:crypto';
import { Lucia, TimeSpan, type Adapter, type DatabaseSession } from 'lucia';
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

const SESSION_DAYS = 30;

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

declare module 'lucia' {
	interface Register {
		Lucia: ReturnType<typeof createLucia>;
		DatabaseUserAttributes: Attributes;
	}
}

function createLucia(db: Database, secure: boolean) {
	return new Lucia<Record<never, never>, Attributes>(
		hashingAdapter(new DrizzlePostgreSQLAdapter(db, sessions, users)),
		{
			sessionExpiresIn: new TimeSpan(SESSION_DAYS, 'd'),
			sessionCookie: {
				name: 'yardglass-session',
				attributes: { secure, sameSite: 'lax', path: '/' }
			},
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
		async create(userId: string): Promise<SessionCookie> {
			const session = await lucia.createSession(userId, {});
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
			const { user, session } = await lucia.validateSession(token);
			if (user === null) return { user: null, session: null, renewed: null };
			return {
				user,
				session: { id: session.id, expiresAt: session.expiresAt },
				renewed: session.fresh ? cookie(session.id, SESSION_DAYS * 86_400) : null
			};
		},
		end: (token: string): Promise<void> => lucia.invalidateSession(token),
		endAllOf: (userId: string): Promise<void> => lucia.invalidateUserSessions(userId),
		blankCookie: (): SessionCookie => cookie('', 0),
		deleteExpired: (): Promise<void> => lucia.deleteExpiredSessions()
	};
}
