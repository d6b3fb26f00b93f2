import { createCipheriv, createDecipheriv, hkdfSync, randomBytes } from 'node:crypto';

/**
 * Keys at rest: AES-256-GCM under a key derived from the installation's secret (HKDF, RFC 5869),
 * bound to the yard and provider they were given for, so that a row copied to another yard does
 * not open there.
 */

const CIPHER = 'aes-256-gcm';
const NONCE_BYTES = 12;
const TAG_BYTES = 16;

const keyOf = (secret: string): Buffer =>
	Buffer.from(hkdfSync('sha256', secret, '', 'yardglass forecast keys', 32));

/** A text sealed for a purpose, base64url: nonce, tag, what is hidden. */
export function seal(secret: string, purpose: string, text: string): string {
	const nonce = randomBytes(NONCE_BYTES);
	const cipher = createCipheriv(CIPHER, keyOf(secret), nonce);
	cipher.setAAD(Buffer.from(purpose));
	const hidden = Buffer.concat([cipher.update(text, 'utf8'), cipher.final()]);
	return Buffer.concat([nonce, cipher.getAuthTag(), hidden]).toString('base64url');
}

/** The text of a seal; null under another secret, for another purpose or where it was altered. */
export function unseal(secret: string, purpose: string, sealed: string): string | null {
	const bytes = Buffer.from(sealed, 'base64url');
	const hidden = bytes.subarray(NONCE_BYTES + TAG_BYTES);
	try {
		const cipher = createDecipheriv(CIPHER, keyOf(secret), bytes.subarray(0, NONCE_BYTES), {
			authTagLength: TAG_BYTES
		});
		cipher.setAAD(Buffer.from(purpose));
		cipher.setAuthTag(bytes.subarray(NONCE_BYTES, NONCE_BYTES + TAG_BYTES));
		return Buffer.concat([cipher.update(hidden), cipher.final()]).toString('utf8');
	} catch {
		return null;
	}
}
