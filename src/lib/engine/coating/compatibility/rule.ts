/** Why a combination is warned of. None is ever refused: the tin and the yard decide. */
export interface CompatibilityRule {
	readonly what: string;
	readonly reason: string;
	/** A publication, or "common practice". */
	readonly source: string;
	readonly severity: 'warn';
	/** Told once for a face, or at every step it holds for. */
	readonly told: 'once' | 'everyStep';
}

export const rule = (
	what: string,
	reason: string,
	source = 'common practice',
	told: CompatibilityRule['told'] = 'once'
): CompatibilityRule => ({ what, reason, source, severity: 'warn', told });
