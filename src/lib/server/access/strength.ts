import { ZxcvbnFactory } from '@zxcvbn-ts/core';
import * as common from '@zxcvbn-ts/language-common';
import * as english from '@zxcvbn-ts/language-en';
import { z } from 'zod';

/** Guesses it should take: 3 of the judge's 0 to 4, "safe from an attack on a stolen table for a while". */
const LEAST_SCORE = 3;
const SHORTEST = 8;
/** Judging takes longer with the square of the length; what is strong so far stays so. */
const MOST_JUDGED = 64;

let judge: ZxcvbnFactory | null = null;

/** Built at its first use: its dictionaries are megabytes that most processes never need. */
function judgeOf(): ZxcvbnFactory {
	judge ??= new ZxcvbnFactory({
		dictionary: { ...common.dictionary, ...english.dictionary },
		graphs: common.adjacencyGraphs,
		translations: english.translations
	});
	return judge;
}

/**
 * What is wrong with a passphrase, in a sentence that says what to do; null where it is strong
 * enough.
 *
 * @param known - the person's name, e-mail, yard: a passphrase made of them is easily guessed
 */
export function passphraseWeakness(passphrase: string, known: readonly string[]): string | null {
	if (passphrase.length < SHORTEST)
		return `Use ${SHORTEST} characters or more; four or five words do well.`;
	const { score, feedback } = judgeOf().check(passphrase.slice(0, MOST_JUDGED), [...known]);
	if (score >= LEAST_SCORE) return null;
	const why = feedback.warning ?? '';
	return `That is easily guessed. ${why === '' ? '' : `${why.replace(/\.?$/, '.')} `}Four or five words that do not belong together do well.`;
}

export const passphraseSchema = z
	.string()
	.min(1, 'Type a passphrase.')
	.max(1000, 'Use at most 1000 characters.');
