import { textWidth } from '../charts/textWidth';

export const LABEL_SIZE = 13.5;

/** A block on its lath, px. */
export interface BlockPlace {
	readonly left: number;
	readonly right: number;
	/** Above the lath, and the block's own height. */
	readonly above: number;
	readonly height: number;
}

/** What lies round the block. */
export interface BlockRoom {
	/** Width of the axis. */
	readonly width: number;
	/** Outside the block: also above it where no lath lies within 20 px, only beside it, or nowhere. */
	readonly outside: 'above' | 'beside' | 'none';
}

export interface Label {
	readonly x: number;
	/** Baseline, px from the lath's upper edge, down. */
	readonly y: number;
	readonly anchor: 'start' | 'middle' | 'end';
	readonly inside: boolean;
}

const SPARE_INSIDE = 7;
const SPARE_BESIDE = 7;
/** Baseline over the block, and over the lath beside it. */
const OVER_BLOCK = 4;
const OVER_LATH = 3.5;
/** Middle of the figures above their baseline, as a share of the size. */
const HALF_FIGURE = 0.35;

/**
 * Where the start of a block stands: the first free of inside it, above it, right of it, left of
 * it. Null where none is: the row's label or the reading has it.
 */
export function blockLabel(
	text: string,
	block: BlockPlace,
	room: BlockRoom,
	size: number = LABEL_SIZE
): Label | null {
	const width = textWidth(text, size, 600);
	const middle = (block.left + block.right) / 2;
	if (block.right - block.left >= width + 2 * SPARE_INSIDE) {
		const y = block.height / 2 - block.above + size * HALF_FIGURE;
		return { x: middle, y, anchor: 'middle', inside: true };
	}
	const onAxis = (left: number) => left >= 0 && left + width <= room.width;
	if (room.outside === 'none') return null;
	if (room.outside === 'above' && onAxis(block.left)) {
		return { x: block.left, y: -block.above - OVER_BLOCK, anchor: 'start', inside: false };
	}
	if (onAxis(block.right + SPARE_BESIDE)) {
		return { x: block.right + SPARE_BESIDE, y: -OVER_LATH, anchor: 'start', inside: false };
	}
	if (onAxis(block.left - SPARE_BESIDE - width)) {
		return { x: block.left - SPARE_BESIDE, y: -OVER_LATH, anchor: 'end', inside: false };
	}
	return null;
}
