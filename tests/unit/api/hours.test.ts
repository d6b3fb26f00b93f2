import { afterEach, expect, test, vi } from 'vitest';
import { hoursQuery } from '../../../src/lib/api/client/hours';
import { hoursFixture } from '../../fixtures/hours';

afterEach(() => vi.unstubAllGlobals());

const answering = (headline: string) => {
	const asked: string[] = [];
	vi.stubGlobal('fetch', (path: string) => {
		asked.push(path);
		return Promise.resolve(
			Response.json(hoursFixture({ headline: [{ text: headline, role: 'plain' }] }))
		);
	});
	return asked;
};
const { signal } = new AbortController();
const told = (answer: { headline: readonly { text: string }[] }) => answer.headline[0].text;

test('hours on their way with the page are waited for, and the next ones asked for', async () => {
	const asked = answering('asked for');
	const coming = Promise.resolve(
		hoursFixture({ headline: [{ text: 'on their way', role: 'plain' }] })
	);
	expect(told(await hoursQuery('tidewrack', coming).queryFn({ signal }))).toBe('on their way');
	expect(asked).toEqual([]);
	// The page is drawn again and makes the query anew; the same hours are not taken twice.
	expect(told(await hoursQuery('tidewrack', coming).queryFn({ signal }))).toBe('asked for');
	expect(asked).toEqual(['/api/v1/yards/tidewrack/hours']);
});

test('hours that did not come are asked for', async () => {
	answering('asked for');
	const lost = Promise.reject(new Error('broken off'));
	const query = hoursQuery('tidewrack', lost);
	await expect(query.queryFn({ signal })).rejects.toThrow('broken off');
	expect(told(await query.queryFn({ signal }))).toBe('asked for');
});
