import { createServer, connect, type AddressInfo, type Server, type Socket } from 'node:net';
import { once } from 'node:events';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { freePort } from '../../../drizzle/server/ports.mjs';
import { healthSchema, type Health } from '../../../src/lib/api/health';
import { createTestDatabase } from '../../setup/database';
import { BUILD_MS, endForSure, ensureBuilt, startNode, until, type Started } from './processes';

const WEB = ['build/index.js'];

/** The way to a database, which can be shut as if the database had stopped, and opened again. */
class Way {
	#server: Server;
	readonly #sockets = new Set<Socket>();

	constructor(target: URL) {
		this.#server = createServer((near) => {
			const far = connect(Number(target.port), target.hostname);
			for (const socket of [near, far]) {
				this.#sockets.add(socket);
				socket.on('error', () => undefined);
				socket.on('close', () => [near, far].forEach((it) => it.destroy()));
			}
			near.pipe(far).pipe(near);
		});
	}

	async open(port = 0): Promise<number> {
		this.#server.listen(port, '127.0.0.1');
		await once(this.#server, 'listening');
		return (this.#server.address() as AddressInfo).port;
	}

	async shut(): Promise<void> {
		if (!this.#server.listening) return;
		const closed = once(this.#server, 'close');
		this.#server.close();
		this.#sockets.forEach((it) => it.destroy());
		this.#sockets.clear();
		await closed;
	}
}

beforeAll(ensureBuilt, BUILD_MS);

describe('health', () => {
	let database: Awaited<ReturnType<typeof createTestDatabase>>;
	let way: Way;
	let wayPort: number;
	let web: Started;
	let origin: string;

	beforeAll(async () => {
		database = await createTestDatabase();
		way = new Way(new URL(database.webUrl));
		wayPort = await way.open();
		const url = new URL(database.webUrl);
		url.port = String(wayPort);
		const port = await freePort();
		origin = `http://127.0.0.1:${port}`;
		web = startNode(WEB, {
			HOST: '127.0.0.1',
			PORT: String(port),
			ORIGIN: origin,
			LOG_LEVEL: 'silent',
			DATABASE_URL: url.toString()
		});
		await until(() => /Listening/.test(web.out()) || !web.lives(), 20_000, web.err);
		expect(web.lives(), web.err()).toBe(true);
	});
	afterAll(async () => {
		await endForSure(web);
		await way.shut();
		await database.drop();
	});

	async function told(): Promise<{ status: number; health: Health }> {
		const answer = await fetch(`${origin}/api/v1/health`);
		return { status: answer.status, health: healthSchema.parse(await answer.json()) };
	}

	test('is up while the database answers, though no worker lives', async () => {
		const { status, health } = await told();
		expect(status).toBe(200);
		expect(health).toMatchObject({ status: 'degraded', database: 'ok' });
	});

	test('is down while the database is stopped, and up again by itself', async () => {
		await way.shut();
		const down = await told();
		expect(down.status).toBe(503);
		expect(down.health).toEqual({ status: 'down', database: 'down', providers: [], queue: null });
		expect(web.lives()).toBe(true);
		await way.open(wayPort);
		await until(async () => (await told()).status === 200, 10_000, web.err);
		expect((await told()).health.database).toBe('ok');
	});
});
