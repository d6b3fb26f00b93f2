import nock from 'nock';
import { afterEach, describe, expect, it } from 'vitest';
import { askJson, type Ask } from '../../../../src/lib/server/forecast/http/ask';
import { MAX_BODY_BYTES } from '../../../../src/lib/server/forecast/http/body';
import { NO_VALIDATORS } from '../../../../src/lib/server/forecast/provider';
import { NOW, stillTools } from './answers';

const HOST = 'http://weather.test';
const ask = (more: Partial<Ask> = {}): Ask => ({
	url: new URL('/hours', HOST),
	provider: 'Some Service',
	userAgent: 'Yardglass/0.1 harbour@yard.example',
	validators: NO_VALIDATORS,
	attempts: 3,
	...more
});
const service = () => nock(HOST).get('/hours');

afterEach(() => {
	const unasked = nock.pendingMocks();
	nock.cleanAll();
	expect(unasked).toEqual([]);
});

describe('a request', () => {
	it('identifies the installation and asks for JSON', async () => {
		nock(HOST, {
			reqheaders: {
				'user-agent': 'Yardglass/0.1 harbour@yard.example',
				accept: 'application/json'
			},
			badheaders: ['if-none-match', 'if-modified-since']
		})
			.get('/hours')
			.reply(200, { a: 1 });
		expect(await askJson(ask(), stillTools())).toMatchObject({ kind: 'body', body: { a: 1 } });
	});

	it('is conditional on what the last answer gave, and 304 keeps it', async () => {
		const validators = { etag: '"v1"', lastModified: 'Tue, 01 Dec 2026 05:17:00 GMT' };
		nock(HOST, {
			reqheaders: { 'if-none-match': '"v1"', 'if-modified-since': validators.lastModified }
		})
			.get('/hours')
			.reply(304, undefined, {
				date: 'Tue, 01 Dec 2026 06:20:00 GMT',
				expires: 'Tue, 01 Dec 2026 06:50:00 GMT'
			});
		expect(await askJson(ask({ validators }), stillTools())).toEqual({
			kind: 'unchanged',
			validators,
			date: NOW,
			expiresAt: NOW + 1_800
		});
	});

	it('keeps the validators of a new answer', async () => {
		service().reply(200, {}, { etag: '"v2"', 'last-modified': 'Tue, 01 Dec 2026 06:17:00 GMT' });
		expect((await askJson(ask(), stillTools())).validators).toEqual({
			etag: '"v2"',
			lastModified: 'Tue, 01 Dec 2026 06:17:00 GMT'
		});
	});

	it('does not believe a 304 that nothing asked for', async () => {
		service().reply(304);
		await expect(askJson(ask(), stillTools())).rejects.toMatchObject({ code: 'wrongFormat' });
	});

	it('uses whatever stands for fetch at that moment', async () => {
		const real = globalThis.fetch;
		globalThis.fetch = () => Promise.resolve(Response.json({ stand: 'in' }));
		try {
			expect(await askJson(ask(), stillTools())).toMatchObject({ body: { stand: 'in' } });
		} finally {
			globalThis.fetch = real;
		}
	});

	it('marks a version that is about to end', async () => {
		service().reply(203, {});
		expect(await askJson(ask(), stillTools())).toMatchObject({ deprecated: true });
	});
});

describe('a failed try', () => {
	it('is repeated with growing, jittered waits', async () => {
		service().times(2).reply(503);
		service().reply(200, { third: true });
		const tools = stillTools();
		expect(await askJson(ask(), tools)).toMatchObject({ body: { third: true } });
		expect(tools.waits).toEqual([250, 500]);
	});

	it('ends as the provider’s fault after the last try', async () => {
		service().times(3).reply(500, { error: true, reason: 'Out of luck.' });
		await expect(askJson(ask(), stillTools())).rejects.toMatchObject({
			code: 'providerFault',
			message: 'Some Service has a fault of its own (HTTP 500): Out of luck.'
		});
	});

	it('is not repeated when only one try is allowed', async () => {
		service().reply(503);
		await expect(askJson(ask({ attempts: 1 }), stillTools())).rejects.toMatchObject({
			code: 'providerFault'
		});
	});

	it('waits the seconds that Retry-After names', async () => {
		service().reply(429, undefined, { 'retry-after': '7' });
		service().reply(200, {});
		const tools = stillTools();
		await askJson(ask(), tools);
		expect(tools.waits).toEqual([7_000]);
	});

	it('waits until the date that Retry-After names', async () => {
		service().reply(503, undefined, { 'retry-after': 'Tue, 01 Dec 2026 06:20:09 GMT' });
		service().reply(200, {});
		const tools = stillTools();
		await askJson(ask(), tools);
		expect(tools.waits).toEqual([9_000]);
	});

	it('does not wait longer than the time for everything, and says until when', async () => {
		service().reply(429, undefined, { 'retry-after': '3600' });
		const tools = stillTools();
		await expect(askJson(ask(), tools)).rejects.toMatchObject({
			code: 'rateLimited',
			retryAt: NOW + 3_600
		});
		expect(tools.waits).toEqual([]);
	});

	it('is not repeated at once against a limit that names no time', async () => {
		service().reply(429, { error: true, reason: 'Minutely API request limit exceeded.' });
		await expect(askJson(ask(), stillTools())).rejects.toMatchObject({
			code: 'rateLimited',
			retryAt: null
		});
	});

	it('is not repeated when the request itself is refused', async () => {
		service().reply(403, '<html>blocked</html>');
		await expect(askJson(ask(), stillTools())).rejects.toMatchObject({
			code: 'refused',
			message: 'Some Service refuses the request (HTTP 403).'
		});
	});

	it('times out, and is repeated', async () => {
		service().times(2).delay(2_000).reply(200, {});
		const tools = { ...stillTools(), attemptTimeout: 30 };
		await expect(askJson(ask({ attempts: 2 }), tools)).rejects.toMatchObject({
			code: 'timeout',
			message: expect.stringContaining('Some Service did not answer')
		});
		nock.abortPendingRequests();
	});

	it('is repeated when there is no connection', async () => {
		service().replyWithError('connection reset');
		service().reply(200, { ok: 1 });
		expect(await askJson(ask(), stillTools())).toMatchObject({ body: { ok: 1 } });
	});

	it('ends as unreachable when there never is one', async () => {
		service().times(3).replyWithError('connection reset');
		await expect(askJson(ask(), stillTools())).rejects.toMatchObject({ code: 'unreachable' });
	});
});

describe('a body', () => {
	it.each(['{"hourly": {"time": [1, 2', '{"t": NaN}', '<html>', ''])(
		'that is no whole JSON (%j) is refused at once',
		async (body) => {
			service().reply(200, body);
			await expect(askJson(ask(), stillTools())).rejects.toMatchObject({ code: 'notJson' });
		}
	);

	it('longer than any true answer is not read to its end', async () => {
		service().reply(200, 'x'.repeat(MAX_BODY_BYTES + 1));
		await expect(askJson(ask(), stillTools())).rejects.toMatchObject({ code: 'tooLarge' });
	});
});
