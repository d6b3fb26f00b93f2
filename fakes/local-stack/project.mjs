import { spawn } from 'node:child_process';
import { createHash } from 'node:crypto';
import {
	existsSync,
	lstatSync,
	mkdirSync,
	readdirSync,
	readFileSync,
	statSync,
	writeFileSync
} from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { exclusively } from './exclusive.mjs';
import { say } from './say.mjs';

/** The checkout this command runs in. */
export const ROOT = fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, '');
const OWN_FOLDER = join(ROOT, '.local');
const BUILT_FROM = [
	'src',
	'static',
	'package-lock.json',
	'svelte.config.js',
	'vite.config.ts',
	'tailwind.config.ts'
];

/** Runs a command to its end; throws with its output where it fails. */
export function runToEnd(command, args, { env = {}, show = false } = {}) {
	return new Promise((resolve, reject) => {
		const child = spawn(command, args, {
			cwd: ROOT,
			env: { ...process.env, ...env },
			stdio: ['ignore', show ? 'inherit' : 'pipe', show ? 'inherit' : 'pipe']
		});
		let output = '';
		child.stdout?.on('data', (chunk) => (output += chunk));
		child.stderr?.on('data', (chunk) => (output += chunk));
		child.once('error', reject);
		child.once('exit', (code) => {
			if (code === 0) resolve(output);
			else
				reject(
					new Error(
						`${command} ${args.join(' ')} ended with ${code}\n${output.split('\n').slice(-40).join('\n')}`
					)
				);
		});
	});
}

function* filesUnder(path) {
	if (!existsSync(path)) return;
	if (statSync(path).isFile()) {
		yield path;
		return;
	}
	for (const name of readdirSync(path).sort()) yield* filesUnder(join(path, name));
}

function fingerprint(paths) {
	const hash = createHash('sha256');
	for (const path of paths)
		for (const file of filesUnder(join(ROOT, path))) hash.update(file).update(readFileSync(file));
	return hash.digest('hex');
}

/** Does something once for each state of some files; `made` says whether its product is there. */
async function onceFor(name, paths, made, work) {
	mkdirSync(OWN_FOLDER, { recursive: true });
	await exclusively(join(OWN_FOLDER, `${name}.lock`), async () => {
		const stamp = join(OWN_FOLDER, `${name}.stamp`);
		const wanted = fingerprint(paths);
		const have = existsSync(stamp) ? readFileSync(stamp, 'utf8') : '';
		if (made() && have === wanted) return;
		await work();
		writeFileSync(stamp, wanted);
	});
}

/** Packages of a lock file by their place; the project itself is none. */
function packagesOf(lockFile) {
	if (!existsSync(lockFile)) return {};
	const { packages } = JSON.parse(readFileSync(lockFile, 'utf8'));
	delete packages[''];
	return packages;
}

/** Whether npm last installed what the lock file says; it leaves out packages for other machines. */
function installedAsLocked() {
	const locked = packagesOf(join(ROOT, 'package-lock.json'));
	const installed = packagesOf(join(ROOT, 'node_modules', '.package-lock.json'));
	return (
		Object.entries(locked).every(
			([place, { version, optional, devOptional }]) =>
				installed[place]?.version === version ||
				(installed[place] === undefined && (optional || devOptional))
		) && Object.keys(installed).every((place) => place in locked)
	);
}

/** Installs the locked dependencies unless they are there. */
export async function ensureDependencies() {
	mkdirSync(OWN_FOLDER, { recursive: true });
	await exclusively(join(OWN_FOLDER, 'dependencies.lock'), async () => {
		if (installedAsLocked()) return;
		// An install empties the folder first, and a link leads to one that others work with.
		if (lstatSync(join(ROOT, 'node_modules'), { throwIfNoEntry: false })?.isSymbolicLink())
			throw new Error('node_modules is a link to other dependencies than the locked ones.');
		say('Installing the locked dependencies');
		await runToEnd('npm', ['ci', '--no-fund', '--no-audit']);
	});
}

/** Builds the web process unless the build is of these sources. */
export function ensureBuild() {
	return onceFor(
		'build',
		BUILT_FROM,
		() => existsSync(join(ROOT, 'build', 'index.js')),
		async () => {
			say('Building');
			await runToEnd(process.execPath, [
				join(ROOT, 'node_modules', 'vite', 'bin', 'vite.js'),
				'build'
			]);
		}
	);
}
