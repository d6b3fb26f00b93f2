import { expect, test } from 'vitest';
import { WARNING_CODES } from '../../../src/lib/engine';
import { warningSentence } from '../../../src/lib/sentences/warning';

const BARE = {
	step: 1,
	after: 0,
	hours: 5.8,
	hasStarts: false,
	slots: 1,
	opens: '2026-05-04T08:00:00Z',
	closes: '2026-05-06T10:30:00Z',
	launch: '2026-05-08T07:00:00Z',
	launchBy: '2026-05-08T07:00:00Z',
	readyAt: '2026-05-09T12:00:00Z'
};
const say = (code: (typeof WARNING_CODES)[number], change: Partial<typeof BARE> = {}) =>
	warningSentence({ ...BARE, code, ...change }, ['coat 1', 'coat 2'], 'Europe/Lisbon');

test('every warning is a whole sentence without a hole in it', () => {
	for (const code of WARNING_CODES) {
		const sentence = say(code);
		expect(sentence, code).toMatch(/^[A-Z].*[.]$/);
		expect(sentence, code).not.toMatch(/null|undefined|NaN/);
	}
});

test('it names the steps, and times in the yard’s zone', () => {
	expect(say('noStretchInWindow')).toBe(
		'No hour is open for coat 2 in the recoat window of coat 1, from Mon 4 May, 09:00 to Wed 6 May, 11:30.'
	);
	expect(say('fewHoursLeft')).toContain('Only 5 open hours are left for coat 2');
	expect(say('launchSlotsShut')).toBe('The one launch slot ahead is shut for coat 2.');
	expect(say('launchSlotsShut', { slots: 3 })).toContain('None of the 3 launch slots');
	expect(say('nothingFits', { hasStarts: true })).toContain('what comes before leaves no hour');
});
