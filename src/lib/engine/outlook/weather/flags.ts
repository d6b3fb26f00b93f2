import { SLOT_FLAGS, type SlotFlag } from '../../vocabulary';

/** The bit of a slot flag in a slot's flag word. */
export function flagBit(flag: SlotFlag): number {
	return 1 << SLOT_FLAGS.indexOf(flag);
}

/** The flags set in a flag word. */
export function flagNames(word: number): SlotFlag[] {
	return SLOT_FLAGS.filter((flag) => (word & flagBit(flag)) !== 0);
}
