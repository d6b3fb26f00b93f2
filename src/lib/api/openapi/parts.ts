import { z } from 'zod';
import { MOST_ITEMS, USUAL_ITEMS } from '../list';

export type Json = Record<string, unknown>;

/** What one subject adds to the document. */
export interface Part {
	readonly paths: Json;
	readonly schemas: Json;
}

export const schemaOf = (schema: z.ZodType, io: 'input' | 'output'): Json => {
	// An instant's text becomes a number on the way in: what is sent is the text.
	const schemaDocument: Json = z.toJSONSchema(schema, { io, unrepresentable: 'any' });
	// The dialect is the OpenAPI document's own.
	delete schemaDocument.$schema;
	return schemaDocument;
};

export const answer = (description: string, name: string): Json => ({
	description,
	content: { 'application/json': { schema: { $ref: `#/components/schemas/${name}` } } }
});
/** The JSON a request carries. */
export const body = (name: string): Json => ({
	required: true,
	content: { 'application/json': { schema: { $ref: `#/components/schemas/${name}` } } }
});

const PROBLEM_TEXT: Record<number, string> = {
	400: 'The request is wrong; `errors` names each field',
	401: 'Nobody is signed in',
	403: 'The role does not allow it',
	404: 'There is none, or it is not yours to see',
	409: 'Something else stands in the way',
	413: 'The body is too large',
	415: 'The body is of a type not taken here',
	429: 'Too many requests; see `Retry-After`',
	503: 'Not able to answer now'
};
export const problems = (...statuses: number[]): Json =>
	Object.fromEntries(
		statuses.map((status) => [
			String(status),
			{
				description: PROBLEM_TEXT[status],
				content: {
					'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } }
				}
			}
		])
	);

export const parameter = (
	name: string,
	where: 'path' | 'query',
	description: string,
	schema: Json
): Json => ({
	name,
	in: where,
	required: true,
	description,
	schema
});
export const optional = (name: string, description: string, schema: Json): Json => ({
	...parameter(name, 'query', description, schema),
	required: false
});
export const UUID = { type: 'string', format: 'uuid' };
export const BOAT = parameter('boat', 'path', 'The boat', UUID);
export const SLUG = parameter('slug', 'path', 'The yard, as in its address', { type: 'string' });
/** Signed in by cookie, or with a token that holds what `lib/server/access/scopes.ts` asks of it. */
export const SIGNED_IN = [{ session: [] }, { token: [] }];

/** What every list can be asked, before its own filters. */
export const LIST_PARAMETERS = [
	optional('q', 'Words to look for', { type: 'string', maxLength: 100 }),
	optional('limit', 'The most items of one answer', {
		type: 'integer',
		minimum: 1,
		maximum: MOST_ITEMS,
		default: USUAL_ITEMS
	}),
	optional('cursor', '`next` of the answer before, as it came', { type: 'string' })
];

/** A whole list as a file. */
export const csvAnswer = (description: string): Json => ({
	description: `${description}, as CSV (RFC 4180) in UTF-8 with a header row`,
	content: { 'text/csv': { schema: { type: 'string' } } }
});
