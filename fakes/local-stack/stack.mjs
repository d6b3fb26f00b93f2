import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { startCluster } from '../../drizzle/server/cluster.mjs';
import { freePort, isFree } from '../../drizzle/server/ports.mjs';
import { Children } from './children.mjs';
import { findPostgres } from './debian.mjs';
import { takeLock } from './exclusive.mjs';
import { keysSecret } from './keysSecret.mjs';
import { ensureBuild, ROOT, runToEnd } from './project.mjs';
import { say } from './say.mjs';

const DATABASE = 'yardglass';
const DEFAULT_PORT = 4173;
const READY_MS = 120_000;
const TSX = ['--import', 'tsx'];

/** Ports of other services that the Fetch standard, and so every browser, refuses to open. */
async function isRefusedByBrowsers(port) {
	try {
		await fetch(`http://127.0.0.1:${port}`);
		return false;
	} catch (error) {
		return error.cause?.message === 'bad port';
	}
}

/** The port asked for, or the usual one, or a free one where that is taken. */
async function choosePort(asked) {
	if (asked !== undefined) {
		const port = Number(asked);
		if (!Number.isInteger(port) || port < 1 || port > 65_535)
			throw new Error(`PORT is ${asked}, which is not a port number (1 to 65535).`);
		if (await isRefusedByBrowsers(port))
			throw new Error(`Browsers refuse to open port ${port}. Set PORT to another.`);
		if (!(await isFree(port))) throw new Error(`Port ${port} is in use. Set PORT to another.`);
		return port;
	}
	return (await isFree(DEFAULT_PORT)) ? DEFAULT_PORT : freePort();
}

async function answered(url, accept, doing) {
	const until = Date.now() + READY_MS;
	for (;;) {
		try {
			const response = await fetch(url);
			if (response.ok && accept(await response.json())) return;
		} catch {
			// Not listening yet.
		}
		if (Date.now() > until) throw new Error(`${doing} did not happen within ${READY_MS / 1000} s.`);
		await wait(200);
	}
}

/**
 * Starts everything on loopback: database, fakes, web and worker.
 *
 * @param {{ dataFolder: string, port?: string, dev?: boolean, throwAway?: boolean, fakeWeather?: string[], environment?: Record<string, string> }} options
 */
export async function startStack({
	dataFolder,
	port,
	dev = false,
	throwAway = false,
	fakeWeather = ['--time-zone', 'Europe/Lisbon'],
	environment = {}
}) {
	mkdirSync(dataFolder, { recursive: true });
	const lock = takeLock(join(dataFolder, 'stack.lock'));
	if (lock === null)
		throw new Error(
			`Another Yardglass runs on ${dataFolder}. Stop it, or set DATA_DIR to another folder.`
		);
	const logs = join(dataFolder, 'logs');
	mkdirSync(logs, { recursive: true });
	const stops = [() => lock.release()];
	const stop = async () => {
		for (const end of stops.splice(0).reverse()) await end();
	};
	try {
		const webPort = await choosePort(port);
		const origin = `http://127.0.0.1:${webPort}`;
		const postgres = await findPostgres(dataFolder);
		say('Starting the database');
		const cluster = await startCluster({ dataFolder, ...postgres, throwAway });
		stops.push(() => cluster.stop());
		const databaseUrl = cluster.urlOf(DATABASE);
		const webUrl = cluster.webUrlOf(DATABASE);
		const prepared = await runToEnd(process.execPath, [
			...TSX,
			join(ROOT, 'drizzle/prepare.ts'),
			cluster.url,
			databaseUrl,
			webUrl
		]);
		const { accounts } = JSON.parse(prepared.trim().split('\n').at(-1));
		if (!dev) await ensureBuild();

		let died = () => undefined;
		const children = new Children(logs, (name, code, tail) => died(name, code, tail));
		const death = new Promise((_, reject) => {
			died = (name, code, tail) => reject(new Error(`${name} ended by itself (${code}).\n${tail}`));
		});
		death.catch(() => undefined);
		stops.push(() => children.stop());

		const fakes = await startFakes(children, fakeWeather, environment);
		const env = {
			NODE_ENV: dev ? 'development' : 'production',
			DATABASE_URL: databaseUrl,
			ORIGIN: origin,
			HOST: '127.0.0.1',
			PORT: String(webPort),
			DEMO: 'true',
			KEYS_SECRET: keysSecret(dataFolder),
			FILES_FOLDER: join(dataFolder, 'files'),
			// The product holds every address to its own limit.
			BODY_SIZE_LIMIT: 'Infinity',
			...fakes.environment,
			...environment
		};
		const web = dev
			? [
					join(ROOT, 'node_modules/vite/bin/vite.js'),
					'dev',
					'--host',
					'127.0.0.1',
					'--port',
					String(webPort),
					'--strictPort'
				]
			: [join(ROOT, 'build/index.js')];
		// The web process is held by row-level security; the worker owns the tables.
		children.start('web', process.execPath, web, { ...env, DATABASE_URL: webUrl });
		children.start(
			'worker',
			process.execPath,
			[...TSX, join(ROOT, 'src/lib/server/work/worker.ts')],
			env
		);
		await Promise.race([
			death,
			answered(
				`${origin}/api/v1/health`,
				// The first screen is never empty: a forecast has come, or nobody can give one.
				({ providers }) => providers.some((it) => it.lastSuccessAt !== null || it.circuitOpen),
				'A first forecast'
			)
		]);
		return {
			origin,
			accounts,
			databaseUrl,
			adminUrl: cluster.url,
			webUrl,
			fakes: fakes.addresses,
			death,
			stop
		};
	} catch (error) {
		await stop();
		throw error;
	}
}

/** Starts the fakes that no real service stands in for. */
async function startFakes(children, weather, environment) {
	const given = { ...process.env, ...environment };
	const addresses = {};
	const settings = {};
	if (given.OPEN_METEO_URL === undefined && given.MET_NORWAY_URL === undefined) {
		const port = await freePort();
		const url = `http://127.0.0.1:${port}`;
		children.start('forecast-fake', process.execPath, [
			...TSX,
			join(ROOT, 'fakes/forecast/server.ts'),
			'--port',
			String(port),
			...weather
		]);
		addresses.forecast = url;
		Object.assign(settings, {
			OPEN_METEO_URL: url,
			OPEN_METEO_ENSEMBLE_URL: url,
			OPEN_METEO_CUSTOMER_URL: url,
			OPEN_METEO_CUSTOMER_ENSEMBLE_URL: url,
			MET_NORWAY_URL: url,
			FORECAST_CONTACT: 'yard@yardglass.example'
		});
	}
	if (given.SMTP_URL !== undefined) return { addresses, environment: settings };
	const [smtpPort, pagePort] = [await freePort(), await freePort()];
	settings.SMTP_URL = `smtp://127.0.0.1:${smtpPort}`;
	children.start('mail-fake', process.execPath, [
		...TSX,
		join(ROOT, 'fakes/mail/server.ts'),
		'--smtp-port',
		String(smtpPort),
		'--page-port',
		String(pagePort)
	]);
	addresses.mail = `http://127.0.0.1:${pagePort}`;
	return { addresses, environment: settings };
}
