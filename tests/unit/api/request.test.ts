import nock from 'nock';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { askForecast } from '../../../src/lib/api/client/forecast';
import { hoursQuery } from '../../../src/lib/api/client/hours';
import { readingQuery } from '../../../src/lib/api/client/reading';
import { ApiFailure } from '../../../src/lib/api/client/request';

const ORIGIN = 'http://yard.test';
const PATH = '/api/v1/yards/tidewrack/hours';
const { signal } = new AbortController();
const ask = () => hoursQuery('tidewrack').queryFn({ signal });

// A page asks relative to itself; a test has no page.
beforeEach(() => {
	const { fetch } = globalThis;
	vi.stubGlobal('fetch', (path: string, init: RequestInit) => fetch(new URL(path, ORIGIN), init));
});
afterEach(() => {
	vi.unstubAllGlobals();
	nock.cleanAll();
});

async function failure(asked: Promise<unknown>): Promise<ApiFailure> {
	const thrown: unknown = await asked.then(
		() => new Error('it answered'),
		(reason: unknown) => reason
	);
	if (!(thrown instanceof ApiFailure)) throw thrown;
	return thrown;
}

describe('asking the application’s own routes', () => {
	test('a good answer is given as it comes', async () => {
		nock(ORIGIN).get(PATH).reply(200, { slotCount: 384 });
		expect(await ask()).toEqual({ slotCount: 384 });
	});

	test('a problem document gives its sentence, its status and its number', async () => {
		nock(ORIGIN)
			.get(PATH)
			.reply(500, { title: 'Broken', detail: 'It is logged.', requestId: '5f2c11aa' });
		expect(await failure(ask())).toMatchObject({
			message: 'It is logged.',
			status: 500,
			requestId: '5f2c11aa'
		});
	});

	test('a proxy’s own page gives the status and the number of the header', async () => {
		nock(ORIGIN).get(PATH).reply(502, '<h1>Bad gateway</h1>', { 'x-request-id': 'ab12' });
		expect(await failure(ask())).toMatchObject({ status: 502, requestId: 'ab12' });
	});

	test('no answer at all has no status', async () => {
		nock(ORIGIN).get(PATH).replyWithError('socket hang up');
		expect(await failure(ask())).toMatchObject({ status: null, requestId: null });
	});

	test('giving up is no failure of the server', async () => {
		const given = new AbortController();
		given.abort();
		const asked = hoursQuery('tidewrack').queryFn({ signal: given.signal });
		await expect(asked).rejects.toHaveProperty('name', 'AbortError');
	});
});

describe('addresses', () => {
	test('a reading is asked for by step and instant, safely written', async () => {
		nock(ORIGIN)
			.get('/api/v1/yards/a%2Fb/steps/step-1/reading')
			.query({ at: '2026-05-13T08:45:00.000Z' })
			.reply(200, { stepId: 'step-1' });
		const query = readingQuery('a/b', 'step-1', Date.parse('2026-05-13T08:45:00Z'));
		expect(await query.queryFn({ signal })).toEqual({ stepId: 'step-1' });
		expect(query.queryKey).toContain('2026-05-13T08:45:00.000Z');
	});

	test('asking the provider is a post', async () => {
		nock(ORIGIN).post('/api/v1/yards/tidewrack/forecast').reply(200, { troubles: [] });
		expect(await askForecast('tidewrack')).toEqual({ troubles: [] });
	});
});
