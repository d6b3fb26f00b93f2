import { expect, test } from 'vitest';
import { z } from 'zod';
import { SHEET_DOCUMENT } from '../../../src/lib/api/sheetDocument';
import { SAMPLE_SHEETS } from '../../../src/lib/engine';

const read = z.fromJSONSchema(SHEET_DOCUMENT as Parameters<typeof z.fromJSONSchema>[0]);

test.each(Object.entries(SAMPLE_SHEETS))('the published schema takes the sample %s', (_, sheet) => {
	expect(read.safeParse(sheet).error).toBeUndefined();
});

const sheet = SAMPLE_SHEETS.epoxyBarrier;
test.each([
	['a field it has no place for', { ...sheet, colour: 'grey' }],
	['a kind of coating it does not know', { ...sheet, type: 'limewash' }],
	['a table without rows', { ...sheet, times: { overcoatMin: [] } }],
	['a row without its minutes', { ...sheet, times: { overcoatMin: [[10]] } }],
	['a row past the hottest surface', { ...sheet, times: { overcoatMin: [[150, 60]] } }],
	['no hazards', { ...sheet, hazards: undefined }]
])('it refuses %s', (_, input) => {
	expect(read.safeParse(JSON.parse(JSON.stringify(input))).success).toBe(false);
});
