import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { expect, test } from 'vitest';
import { TAKEN_SLUGS } from '../../../../src/lib/server/access/foundYard';

const ROUTES = join(import.meta.dirname, '../../../../src/routes');
const foldersOf = (path: string): string[] =>
	readdirSync(path, { withFileTypes: true })
		.filter((entry) => entry.isDirectory())
		.map(({ name }) => name);

test('no yard can take the address of a page of the product', () => {
	const top = foldersOf(ROUTES).flatMap((name) =>
		name.startsWith('(') ? foldersOf(join(ROUTES, name)) : [name]
	);
	const pages = top.filter((name) => !name.startsWith('['));
	expect(pages.length).toBeGreaterThan(6);
	expect(pages.filter((name) => !TAKEN_SLUGS.includes(name))).toEqual([]);
});
