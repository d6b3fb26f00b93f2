import { spawn } from 'node:child_process';
import { createWriteStream } from 'node:fs';
import { join } from 'node:path';

const TAIL_LINES = 30;
const STOP_MS = 15_000;

/**
 * Long-running processes of a stack: started in order, stopped in the opposite one. Each writes
 * its output to a file of its own; a process that ends by itself is told with its last lines.
 */
export class Children {
	#running = [];
	#stopping = false;
	/** @param {string} logFolder @param {(name: string, code: number | null, tail: string) => void} onDeath */
	constructor(logFolder, onDeath) {
		this.logFolder = logFolder;
		this.onDeath = onDeath;
	}

	start(name, command, args, env) {
		const child = spawn(command, args, {
			env: { ...process.env, ...env },
			stdio: ['ignore', 'pipe', 'pipe'],
			// A group of its own: Ctrl-C reaches the stack alone, which then stops them in order.
			detached: true
		});
		const file = createWriteStream(join(this.logFolder, `${name}.log`), { flags: 'a' });
		const tail = [];
		const keep = (chunk) => {
			file.write(chunk);
			tail.push(...String(chunk).split('\n').filter(Boolean));
			tail.splice(0, Math.max(0, tail.length - TAIL_LINES));
		};
		child.stdout.on('data', keep);
		child.stderr.on('data', keep);
		const entry = { name, child, ended: false };
		entry.exit = new Promise((resolve) => {
			const end = (code) => {
				if (entry.ended) return;
				entry.ended = true;
				file.end();
				if (!this.#stopping) this.onDeath(name, code, tail.join('\n'));
				resolve();
			};
			child.once('exit', end);
			child.once('error', (error) => {
				tail.push(error.message);
				end(null);
			});
		});
		this.#running.push(entry);
		return entry;
	}

	/** Ends all, last started first; what has not gone in time is killed. */
	async stop() {
		this.#stopping = true;
		for (const { child, exit, ended } of this.#running.reverse()) {
			if (ended) continue;
			child.kill('SIGTERM');
			const killer = setTimeout(() => child.kill('SIGKILL'), STOP_MS);
			await exit;
			clearTimeout(killer);
		}
		this.#running = [];
	}
}
