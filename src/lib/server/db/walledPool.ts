import pg from 'pg';
import { behalf, type Behalf } from './behalf';

/** A role that row-level security does not hold, where one must be held. */
export class UnwalledError extends Error {
	override readonly name = 'UnwalledError';
	constructor() {
		super(
			'DATABASE_URL signs in as a role that row-level security does not hold. The web process needs the role yardglass_web; owners of the tables and superusers are for migrations and the worker.'
		);
	}
}

type Taken = (
	error: Error | undefined,
	client: pg.PoolClient | undefined,
	done: (release?: Error | boolean) => void
) => void;

const SAY = `select set_config('app.person', $1, false), set_config('app.duty', $2, false)`;
const IS_WALLED = `select row_security_active('users') as walled`;

/**
 * A pool whose connections are told, whenever one is taken, on whose behalf it is: the policies of
 * row-level security go by that. The setting lasts as long as the connection, so a pooler between
 * must hand on whole sessions, not single transactions.
 */
export class WalledPool extends pg.Pool {
	/** What each connection was last told. */
	readonly #told = new WeakMap<pg.PoolClient, string>();

	constructor(
		config: pg.PoolConfig,
		readonly walls: 'required' | 'passed'
	) {
		super(config);
	}

	override connect(): Promise<pg.PoolClient>;
	override connect(callback: Taken): void;
	override connect(callback?: Taken): Promise<pg.PoolClient> | void {
		const taken = this.#take(behalf());
		if (callback === undefined) return taken;
		taken.then(
			(client) => callback(undefined, client, (release) => client.release(release)),
			(error: Error) => callback(error, undefined, () => undefined)
		);
	}

	async #take(who: Behalf): Promise<pg.PoolClient> {
		const client = await super.connect();
		try {
			await this.#tell(client, who);
			return client;
		} catch (error) {
			// It may still speak for somebody else: it is not used again.
			client.release(true);
			throw error;
		}
	}

	async #tell(client: pg.PoolClient, { personId, duty }: Behalf): Promise<void> {
		const words = [personId ?? '', duty ?? ''];
		const told = this.#told.get(client);
		if (told === undefined && this.walls === 'required') {
			const { rows } = await client.query<{ walled: boolean }>(IS_WALLED);
			if (rows[0]?.walled !== true) throw new UnwalledError();
		}
		if (told === words.join(' ')) return;
		this.#told.delete(client);
		await client.query(SAY, words);
		this.#told.set(client, words.join(' '));
	}
}
