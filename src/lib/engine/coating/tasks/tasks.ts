import { FITTING_TASKS } from './fitting';
import { JOINING_TASKS } from './joining';
import { LIFTING_TASKS } from './lifting';
import { SURFACE_TASKS } from './surface';
import type { Task } from './task';

const ALL = [...SURFACE_TASKS, ...JOINING_TASKS, ...FITTING_TASKS, ...LIFTING_TASKS] as const;
export type TaskCode = (typeof ALL)[number]['code'];

/**
 * The usual rules of yard work, for steps that no sheet speaks for. Defaults that a yard edits:
 * each says where its numbers come from.
 */
export const TASKS: readonly (Task & { readonly code: TaskCode })[] = ALL;

const BY_CODE = new Map<string, Task>(TASKS.map((task) => [task.code, task]));

/** The task of a code; null where there is none of that name. */
export function taskOf(code: TaskCode): Task;
export function taskOf(code: string): Task | null;
export function taskOf(code: string): Task | null {
	return BY_CODE.get(code) ?? null;
}
