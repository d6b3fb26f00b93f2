import { describe, expect, test } from 'vitest';
import { changeSentence } from '../../../src/lib/sentences/change';

describe('changeSentence', () => {
	test('says from what to what, in words', () => {
		expect(
			changeSentence(
				{
					subject: 'steps',
					action: 'UPDATE',
					before: { state: 'queued', pinned_at: null },
					after: { state: 'underWay', pinned_at: '2027-03-28' }
				},
				'wash'
			)
		).toBe(
			'changed a step, wash: state from queued to under way; fixed start from nothing to 2027-03-28'
		);
	});
	test('names the field alone where the values are ids', () => {
		const id = '0b9c2c9e-52b7-4a0a-9d6e-3f1d0c0f7a11';
		expect(
			changeSentence({
				subject: 'boats',
				action: 'UPDATE',
				before: { owner_id: id },
				after: { owner_id: id.replace('0', '1') }
			})
		).toBe('changed a boat: owner');
	});
	test('says what was added and what was taken away by its name', () => {
		const boat = { subject: 'boats', before: null, after: { name: 'Corncrake', heading: 1 } };
		expect(changeSentence({ ...boat, action: 'INSERT' })).toBe('added a boat, Corncrake');
		expect(changeSentence({ ...boat, action: 'DELETE', before: boat.after, after: null })).toBe(
			'took away a boat, Corncrake'
		);
	});
	test('counts the fields it does not tell', () => {
		const before = Object.fromEntries('abcdef'.split('').map((name) => [name, 1]));
		const after = Object.fromEntries('abcdef'.split('').map((name) => [name, 2]));
		expect(changeSentence({ subject: 'yards', action: 'UPDATE', before, after })).toMatch(
			/; and 2 more$/
		);
	});
});
