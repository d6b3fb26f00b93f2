import { spawn } from 'node:child_process';
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { setTimeout as wait } from 'node:timers/promises';

/** The checkout, where every command is started. */
export const ROOT = fileURLToPath(new URL('../../..', import.meta.url)).replace(/\/$/, '');
const POLL_MS = 100;

export interface Started {
	readonly pid: number;
	/** What it has written so far. */
	readonly out: () => string;
	readonly err: () => string;
	/** Its exit code; null where a signal ended it. */
	readonly ended: Promise<number | null>;
	readonly lives: () => boolean;
	readonly signal: (signal: NodeJS.Signals) => void;
}

/** Starts Node with nothing of the test runner's own environment but where programs are found. */
export function startNode(args: string[], environment: Record<string, string> = {}): Started {
	const { PATH = '', HOME = '' } = process.env;
	const child = spawn(process.execPath, args, {
		cwd: ROOT,
		env: { PATH, HOME, ...environment },
		stdio: ['ignore', 'pipe', 'pipe']
	});
	if (child.pid === undefined) throw new Error(`Node did not start: ${args.join(' ')}`);
	let [out, err] = ['', ''];
	child.stdout.on('data', (chunk) => (out += String(chunk)));
	child.stderr.on('data', (chunk) => (err += String(chunk)));
	const ended = new Promise<number | null>((resolve) => child.once('close', resolve));
	return {
		pid: child.pid,
		out: () => out,
		err: () => err,
		ended,
		lives: () => child.exitCode === null && child.signalCode === null,
		signal: (signal) => void child.kill(signal)
	};
}

/** A build where none is of these sources; a moment where one is. */
export const BUILD_MS = 110_000;
export async function ensureBuilt(): Promise<void> {
	const build = startNode([
		'-e',
		"import('./fakes/local-stack/project.mjs').then((it) => it.ensureBuild())"
	]);
	if ((await build.ended) !== 0) throw new Error(`It could not be built. ${build.err()}`);
}

/** Ends what a test started, by force where it does not end by itself; never fails. */
export async function endForSure(started: Started | undefined): Promise<void> {
	if (started === undefined || !started.lives()) return;
	started.signal('SIGTERM');
	await Promise.race([started.ended, wait(20_000)]);
	if (started.lives()) started.signal('SIGKILL');
	await started.ended;
}

/** Waits for a condition, not longer than given; what was written so far says why it did not come. */
export async function until(
	holds: () => boolean | Promise<boolean>,
	milliseconds: number,
	told: () => string = () => ''
): Promise<void> {
	const end = Date.now() + milliseconds;
	while (!(await holds())) {
		if (Date.now() > end) throw new Error(`It did not come in ${milliseconds} ms. ${told()}`);
		await wait(POLL_MS);
	}
}

/** Parents of all processes of this machine, by the process. */
function parents(): Map<number, number> {
	const found = new Map<number, number>();
	for (const name of readdirSync('/proc').filter((it) => /^\d+$/.test(it))) {
		try {
			// The command stands in brackets and may hold anything; state and parent follow it.
			const [, parent] =
				readFileSync(`/proc/${name}/stat`, 'utf8').split(') ').at(-1)?.split(' ') ?? [];
			found.set(Number(name), Number(parent));
		} catch {
			// Gone meanwhile.
		}
	}
	return found;
}

/** A process and all that it has started, as far as they still know it. */
export function familyOf(pid: number): number[] {
	const all = parents();
	const family = [pid];
	for (const member of family)
		for (const [child, parent] of all) if (parent === member) family.push(child);
	return family;
}

/** Whether a process is there and no mere entry that waits to be read. */
export function isThere(pid: number): boolean {
	try {
		return !/^State:\s+Z/m.test(readFileSync(`/proc/${pid}/status`, 'utf8'));
	} catch {
		return false;
	}
}

/** Process id of the PostgreSQL of a data folder; null where none has it open. */
export function databaseOf(dataFolder: string): number | null {
	const file = `${dataFolder}/postgres/data/postmaster.pid`;
	return existsSync(file) ? Number(readFileSync(file, 'utf8').split('\n')[0]) : null;
}
