import { fileSchema, filesSchema, MOST_BYTES, MOST_CAPTION, MOST_PIXELS } from '../files';
import {
	answer,
	BOAT,
	optional,
	parameter,
	problems,
	schemaOf,
	SIGNED_IN,
	SLUG,
	UUID,
	type Json,
	type Part
} from './parts';

const FILE = parameter('file', 'path', 'The file', UUID);
const bytes = (...types: string[]): Json =>
	Object.fromEntries(types.map((type) => [type, { schema: { type: 'string', format: 'binary' } }]));
const LIMITS = `A photo has at most ${MOST_BYTES.picture} bytes and ${MOST_PIXELS} pixels, a PDF at most ${MOST_BYTES.pdf} bytes.`;

/** Photos and PDFs of boats. */
export const filesPart: Part = {
	paths: {
		'/yards/{slug}/boats/{boat}/files': {
			get: {
				operationId: 'filesOfBoat',
				summary: 'Photos and PDFs of a boat, oldest first',
				security: SIGNED_IN,
				parameters: [SLUG, BOAT],
				responses: { 200: answer('The files', 'Files'), ...problems(401, 404) }
			},
			post: {
				operationId: 'addFile',
				summary: 'Add a photo or PDF to a boat',
				description: `The body is the file itself, with any content-type: what it is, its bytes say. ${LIMITS} A photo is kept upright and without where it was taken. Sent again under the same id it is kept once.`,
				security: SIGNED_IN,
				parameters: [
					SLUG,
					BOAT,
					parameter('id', 'query', 'Made by who sends, one for each file', UUID),
					optional('name', 'What the file is called', { type: 'string', maxLength: 400 }),
					optional('caption', 'What it shows', { type: 'string', maxLength: MOST_CAPTION })
				],
				requestBody: {
					required: true,
					content: bytes(
						'image/jpeg',
						'image/png',
						'image/webp',
						'image/avif',
						'application/pdf',
						'application/octet-stream'
					)
				},
				responses: {
					201: answer('It is kept', 'File'),
					200: answer('It was kept before', 'File'),
					...problems(400, 401, 403, 404, 409, 413, 415)
				}
			}
		},
		'/yards/{slug}/boats/{boat}/files/{file}': {
			get: {
				operationId: 'fileOfBoat',
				summary: 'What is known of a file, and where its bytes are read',
				security: SIGNED_IN,
				parameters: [SLUG, BOAT, FILE],
				responses: { 200: answer('The file', 'File'), ...problems(401, 404) }
			},
			delete: {
				operationId: 'deleteFile',
				summary: 'Delete a file: one’s own, and a manager any',
				security: SIGNED_IN,
				parameters: [SLUG, BOAT, FILE],
				responses: { 204: { description: 'It is gone' }, ...problems(401, 403, 404) }
			}
		}
	},
	schemas: {
		File: schemaOf(fileSchema, 'output'),
		Files: schemaOf(filesSchema, 'output')
	}
};
