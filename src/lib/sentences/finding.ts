import type { Sentence } from '../api/sentence';
import { counted } from './words';

const plain = (text: string): Sentence => [{ text, role: 'plain' }];

/** What stands in the first sentences' place while the hours are being found. */
export function finding(steps: number): { headline: Sentence; subline: Sentence } {
	return {
		headline: plain(`Finding the hours of ${counted(steps, 'step')}.`),
		subline: plain('Each lath is bare until its hours are found.')
	};
}
