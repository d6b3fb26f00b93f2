import { hash, verify } from '@node-rs/argon2';

/** argon2id at OWASP's minimum: 19 MiB, two passes, one lane. */
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

/** Hash of a password, argon2id, with its salt and cost in it. */
export function hashPassword(password: string): Promise<string> {
	return hash(password, COST);
}

let decoy: Promise<string> | null = null;

/**
 * Whether a password is that of a hash. Without a hash (nobody has that e-mail) the same work is
 * done against a decoy, so that the answer takes as long.
 */
export async function verifyPassword(
	passwordHash: string | null,
	password: string
): Promise<boolean> {
	decoy ??= hashPassword('nobody signs in with this');
	const matches = await verify(passwordHash ?? (await decoy), password);
	return passwordHash !== null && matches;
}
