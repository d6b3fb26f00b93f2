import type { Session, SignedInUser } from '$lib/server/access/sessions';
import type { UsedToken } from '$lib/server/access/tokens';

declare global {
	namespace App {
		interface Error {
			message: string;
			/** Number to give when asking for help; in the log under the same number. */
			requestId?: string;
		}
		/** What a history entry keeps beside its address. */
		interface PageState {
			/** A reading lies open over the page, so that Back closes it. */
			reading?: boolean;
		}
		interface Locals {
			requestId: string;
			user: SignedInUser | null;
			session: Session | null;
			/** What the request signed in with instead of a cookie; null: it did not. */
			token: UsedToken | null;
		}
	}
}

export {};
