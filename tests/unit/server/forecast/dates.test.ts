import { describe, expect, it } from 'vitest';
import {
	freshUntil,
	parseHttpDate,
	parseRetryAfter
} from '../../../../src/lib/server/forecast/http/dates';

/** The example date of RFC 9110 §5.6.7, and its epoch. */
const RFC_DATE = 'Sun, 06 Nov 1994 08:49:37 GMT';
const RFC_EPOCH = 784_111_777;

describe('parseHttpDate', () => {
	it('reads the example of RFC 9110', () => {
		expect(parseHttpDate(RFC_DATE)).toBe(RFC_EPOCH);
	});
	it.each([null, '', '0', '-1', 'soon'])('takes %j for no date', (value) => {
		expect(parseHttpDate(value)).toBeNull();
	});
});

describe('parseRetryAfter', () => {
	it('counts seconds from now', () => {
		expect(parseRetryAfter('120', 1_000)).toBe(1_120);
	});
	it('takes a date as it is', () => {
		expect(parseRetryAfter(RFC_DATE, 1_000)).toBe(RFC_EPOCH);
	});
	it('is null for what is neither', () => {
		expect(parseRetryAfter('later', 1_000)).toBeNull();
	});
});

describe('freshUntil', () => {
	const headers = (values: Record<string, string>) => new Headers(values);
	it('counts the lifetime on our own clock when the provider’s is an hour ahead', () => {
		const answer = headers({
			date: 'Sun, 06 Nov 1994 09:49:37 GMT',
			expires: 'Sun, 06 Nov 1994 10:19:37 GMT'
		});
		expect(freshUntil(answer, RFC_EPOCH)).toBe(RFC_EPOCH + 1_800);
	});
	it('takes the expiry as it is when there is no date', () => {
		expect(freshUntil(headers({ expires: RFC_DATE }), RFC_EPOCH - 60)).toBe(RFC_EPOCH);
	});
	it('is now for an answer that has expired already', () => {
		expect(freshUntil(headers({ expires: RFC_DATE }), RFC_EPOCH + 60)).toBe(RFC_EPOCH + 60);
	});
	it('is null without a readable expiry', () => {
		expect(freshUntil(headers({}), 5)).toBeNull();
		expect(freshUntil(headers({ expires: '0' }), 5)).toBeNull();
	});
});
