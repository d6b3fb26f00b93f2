import { once } from 'node:events';
import { createServer, type IncomingMessage, type ServerResponse } from 'node:http';
import { pathToFileURL } from 'node:url';
import { parseArgs } from 'node:util';
import { FaultBox, find, TARGETS, withBareNaN, type Faults, type Target } from './faults';
import { handleControl } from './control';
import { answerMetNorway, expiresAt, issuedAt, readMetNorwayQuery, tooPrecise } from './metNorway';
import { answerOpenMeteo } from './openMeteo';
import { readQuery } from './openMeteoQuery';
import { stage, type Scenario, type Stage } from './scenario';

export type { Fault, Faults, Target } from './faults';
export type { Scenario } from './scenario';

export interface ForecastFakeOptions {
	/** 0 or left out: any free port. Always on loopback. */
	port?: number;
	/** Left out: the demo's story, its today being the day the fake starts. */
	scenario?: Scenario;
	faults?: Faults;
	/** UTC epoch seconds to stand still at; left out: the machine's clock. */
	now?: number;
}

/** One request as the fake saw it. */
export interface SeenRequest {
	target: Target;
	url: string;
	userAgent: string;
	/** Conditional headers, where there were any. */
	ifModifiedSince: string | null;
	status: number;
}

export interface ForecastFake {
	/** Address of both services, without a path. */
	url: string;
	/** Stops the server and cuts what is still open. */
	close(): Promise<void>;
	setScenario(scenario: Scenario): void;
	setFaults(faults: Faults): void;
	/** UTC epoch seconds to stand still at; null: the machine's clock. */
	setNow(now: number | null): void;
	/** Requests since the start, oldest first. */
	requests(): SeenRequest[];
}

interface Reply {
	status: number;
	headers?: Record<string, string>;
	body: string;
}

const PATHS: Record<string, Target> = {
	'/v1/forecast': 'open-meteo',
	'/v1/ensemble': 'open-meteo-ensemble',
	'/weatherapi/locationforecast/2.0/complete': 'met-norway'
};
const httpDate = (time: number): string => new Date(time * 1000).toUTCString();
const pause = (milliseconds: number) =>
	new Promise<void>((resolve) => setTimeout(resolve, milliseconds).unref());

/**
 * Starts a server on loopback that speaks as Open-Meteo (forecast and ensemble) and as MET Norway
 * (Locationforecast 2.0) do, with switchable faults. `GET` and `POST /_control` show and change
 * scenario, faults and clock of a running fake.
 */
export async function startForecastFake(options: ForecastFakeOptions = {}): Promise<ForecastFake> {
	let fixedNow = options.now ?? null;
	const clock = () => fixedNow ?? Math.floor(Date.now() / 1000);
	let scenario: Scenario = options.scenario ?? { kind: 'story' };
	let current: Stage = stage(scenario, clock());
	const faults = new FaultBox();
	faults.set(options.faults ?? {});
	const seen: SeenRequest[] = [];

	const fake = {
		setScenario(next: Scenario) {
			current = stage(next, clock());
			scenario = next;
		},
		setFaults: (next: Faults) => faults.set(next),
		setNow(now: number | null) {
			fixedNow = now;
		},
		requests: () => [...seen]
	};
	const state = () => ({ scenario, faults: faults.list(), now: fixedNow, requests: seen.length });

	async function handle(request: IncomingMessage, response: ServerResponse): Promise<void> {
		const url = new URL(request.url ?? '/', 'http://127.0.0.1');
		if (url.pathname === '/_control') return handleControl(request, response, fake, state);
		const target = PATHS[url.pathname];
		if (target === undefined) return send(response, { status: 404, body: 'Not found' });

		const active = faults.take(target);
		const delay = find(active, 'delay');
		if (delay !== undefined) await pause(delay.milliseconds);
		const stale = find(active, 'staleIssue');
		const now = clock() - (stale?.hours ?? 0) * 3_600;
		const limited = find(active, 'rateLimited');
		const broken = find(active, 'serverError');
		const refusal = limited ?? broken;
		let reply: Reply;
		if (refusal !== undefined)
			reply = {
				status: refusal.kind === 'rateLimited' ? 429 : refusal.status,
				...(refusal.retryAfter === undefined
					? {}
					: { headers: { 'retry-after': refusal.retryAfter } }),
				body: errorBody(
					target,
					refusal.kind === 'rateLimited'
						? 'Minutely API request limit exceeded. Please try again in one minute.'
						: 'Internal error'
				)
			};
		else reply = answer(target, url, request, current, now, active);
		seen.push({
			target,
			url: request.url ?? '',
			userAgent: request.headers['user-agent'] ?? '',
			ifModifiedSince: request.headers['if-modified-since'] ?? null,
			status: reply.status
		});
		reply = { ...reply, headers: { ...reply.headers, date: httpDate(now) } };
		if (find(active, 'truncated') !== undefined)
			reply = { ...reply, body: reply.body.slice(0, reply.body.length / 2) };
		if (find(active, 'brokenOff') !== undefined) {
			response.writeHead(reply.status, {
				...reply.headers,
				'content-length': Buffer.byteLength(reply.body)
			});
			response.write(reply.body.slice(0, reply.body.length / 2));
			await pause(20);
			response.destroy();
			return;
		}
		send(response, reply);
	}

	const server = createServer((request, response) => {
		response.sendDate = false;
		handle(request, response).catch((error: unknown) => {
			send(response, { status: 500, body: error instanceof Error ? error.message : String(error) });
		});
	});
	server.listen(options.port ?? 0, '127.0.0.1');
	await once(server, 'listening');
	const address = server.address();
	if (address === null || typeof address === 'string') throw new Error('The fake has no port.');
	return {
		...fake,
		url: `http://127.0.0.1:${address.port}`,
		close: () =>
			new Promise((resolve, reject) => {
				server.close((error) => (error === undefined ? resolve() : reject(error)));
				server.closeAllConnections();
			})
	};
}

function send(response: ServerResponse, { status, headers, body }: Reply): void {
	if (response.destroyed) return;
	response.writeHead(status, { 'content-type': 'application/json; charset=utf-8', ...headers });
	response.end(status === 304 ? undefined : body);
}

const errorBody = (target: Target, reason: string): string =>
	target === 'met-norway' ? reason : JSON.stringify({ error: true, reason });

function answer(
	target: Target,
	url: URL,
	request: IncomingMessage,
	current: Stage,
	now: number,
	active: ReturnType<FaultBox['take']>
): Reply {
	if (target === 'met-norway') return answerMet(url, request, current, now, active);
	const kind = target === 'open-meteo' ? 'forecast' : 'ensemble';
	const query = readQuery(url.searchParams, kind === 'forecast' ? 16 : 35);
	if (typeof query === 'string') return { status: 400, body: errorBody(target, query) };
	const body = answerOpenMeteo(kind, query, current, now, active);
	return { status: 200, body: withBareNaN(JSON.stringify(body)) };
}

/** What a browser or a library sends by itself identifies nobody. */
const ANONYMOUS = /^$|^(node|undici|axios|curl|wget|okhttp|python-requests|mozilla)\b/i;

function answerMet(
	url: URL,
	request: IncomingMessage,
	current: Stage,
	now: number,
	active: ReturnType<FaultBox['take']>
): Reply {
	const userAgent = request.headers['user-agent'] ?? '';
	if (ANONYMOUS.test(userAgent) || tooPrecise(url.searchParams))
		return { status: 403, body: 'Forbidden: see the terms of service' };
	const query = readMetNorwayQuery(url.searchParams);
	if (typeof query === 'string') return { status: 400, body: query };
	const issued = issuedAt(now);
	const headers = { 'last-modified': httpDate(issued), expires: httpDate(expiresAt(now)) };
	if (Date.parse(request.headers['if-modified-since'] ?? '') >= issued * 1000)
		return { status: 304, headers, body: '' };
	const body = answerMetNorway(query, current, now, active);
	return { status: 200, headers, body: withBareNaN(JSON.stringify(body)) };
}

async function main(): Promise<void> {
	const { values } = parseArgs({
		options: {
			port: { type: 'string', default: '4010' },
			'time-zone': { type: 'string', default: 'UTC' },
			anchor: { type: 'string' },
			seed: { type: 'string', default: '1' },
			climate: { type: 'string', default: 'mild' },
			replay: { type: 'string' },
			'shift-seconds': { type: 'string', default: '0' }
		}
	});
	const seed = Number(values.seed);
	const fake = await startForecastFake({
		port: Number(values.port),
		scenario:
			values.replay === undefined
				? {
						kind: 'story',
						timeZone: values['time-zone'],
						seed,
						climate: values.climate === 'seasonal' ? 'seasonal' : 'mild',
						...(values.anchor === undefined ? {} : { anchor: values.anchor })
					}
				: {
						kind: 'replay',
						file: values.replay,
						shiftSeconds: Number(values['shift-seconds']),
						seed
					}
	});
	process.stdout.write(`Forecast fake for ${TARGETS.join(', ')} on ${fake.url}\n`);
	for (const signal of ['SIGINT', 'SIGTERM'] as const)
		process.once(signal, () => void fake.close().then(() => process.exit(0)));
}

if (process.argv[1] !== undefined && import.meta.url === pathToFileURL(process.argv[1]).href)
	await main();
