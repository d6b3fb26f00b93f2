import { execFile, spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { isRoot } from '../../drizzle/server/account.mjs';
import { say } from './say.mjs';

const run = promisify(execFile);
const LIMITS = { maxBuffer: 64 * 1024 * 1024 };

const POSTGRES_FOLDERS = '/usr/lib/postgresql';
const POSTGRES_PACKAGE = 'postgresql-15';

/** Binaries of the newest PostgreSQL under a root folder; null without one. */
function postgresUnder(root) {
	const folder = join(root, POSTGRES_FOLDERS);
	if (!existsSync(folder)) return null;
	const versions = readdirSync(folder)
		.filter((version) => existsSync(join(folder, version, 'bin', 'initdb')))
		.sort((a, b) => Number(b) - Number(a));
	return versions.length === 0 ? null : join(folder, versions[0], 'bin');
}

async function installAsRoot(packages) {
	const apt = async (args) =>
		run('apt-get', args, { ...LIMITS, env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' } });
	const install = ['install', '-y', '--no-install-recommends', ...packages];
	try {
		await apt(install);
	} catch {
		// A fresh machine has no package lists yet.
		await apt(['update']);
		await apt(install);
	}
}

/** Names of a package and what it depends on that this machine lacks. */
async function missingWithDependencies(packages) {
	const flags = ['recommends', 'suggests', 'conflicts', 'breaks', 'replaces', 'enhances'].map(
		(kind) => `--no-${kind}`
	);
	const { stdout } = await run(
		'apt-cache',
		['depends', '--recurse', ...flags, ...packages],
		LIMITS
	);
	const names = [...new Set(stdout.split('\n').filter((line) => /^[a-z0-9]/.test(line)))].map(
		(line) => line.trim()
	);
	return names.filter((name) => {
		const status = spawnSync('dpkg-query', ['-W', '-f=${Status}', name], { encoding: 'utf8' });
		return !status.stdout.includes('install ok installed');
	});
}

/** Unpacks packages and what they need into a folder, without installing: no root needed. */
async function unpackInto(packages, folder) {
	mkdirSync(folder, { recursive: true });
	for (const name of await missingWithDependencies(packages)) {
		// Virtual names have nothing to download; the packages that provide them come by themselves.
		await run('apt-get', ['download', name], { ...LIMITS, cwd: folder }).catch(() => undefined);
	}
	for (const file of readdirSync(folder).filter((name) => name.endsWith('.deb'))) {
		await run('dpkg-deb', ['-x', join(folder, file), folder]);
	}
}

const libraryPath = (root) =>
	['usr/lib/x86_64-linux-gnu', 'usr/lib/aarch64-linux-gnu', 'lib/x86_64-linux-gnu', 'usr/lib']
		.map((part) => join(root, part))
		.join(':');

/**
 * Finds a Debian program or gets it: installed as root, unpacked into `folder` otherwise.
 *
 * @template T
 * @param {{ words: string, packages: string[], folder: string, find: (root: string) => T | null }} wanted
 * @returns {Promise<{ found: T, environment: Record<string, string> }>}
 */
async function findOrGet({ words, packages, folder, find }) {
	const installed = find('/');
	if (installed !== null) return { found: installed, environment: {} };
	const unpacked = find(folder);
	const environment = { LD_LIBRARY_PATH: libraryPath(folder) };
	if (unpacked !== null) return { found: unpacked, environment };
	say(`Getting ${words} from Debian's packages`);
	try {
		if (isRoot) await installAsRoot(packages);
		else await unpackInto(packages, folder);
	} catch (error) {
		throw new Error(advice(words, packages), { cause: error });
	}
	const found = find(isRoot ? '/' : folder);
	if (found === null) throw new Error(advice(words, packages));
	return { found, environment: isRoot ? {} : environment };
}

const advice = (words, packages) =>
	`${words} is not on this machine and could not be fetched. As root run: apt-get update && apt-get install -y ${packages.join(' ')}`;

/** The folder of PostgreSQL's server programs, and the environment they need. */
export async function findPostgres(dataFolder) {
	const { found, environment } = await findOrGet({
		words: 'PostgreSQL',
		packages: [POSTGRES_PACKAGE],
		folder: join(dataFolder, 'packages'),
		find: postgresUnder
	});
	return { binaries: found, environment };
}

/** Chromium's program for the browser tests, and the environment it needs. */
export async function findChromium(dataFolder) {
	const { found, environment } = await findOrGet({
		words: 'Chromium',
		packages: ['chromium', 'fonts-liberation'],
		folder: join(dataFolder, 'packages'),
		find: (root) =>
			['usr/bin/chromium', 'usr/lib/chromium/chromium']
				.slice(root === '/' ? 0 : 1)
				.map((part) => join(root, part))
				.find((file) => existsSync(file)) ?? null
	});
	return { program: found, environment };
}
