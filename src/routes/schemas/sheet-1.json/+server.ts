import { SHEET_DOCUMENT } from '$lib/api/sheetDocument';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = () =>
	Response.json(SHEET_DOCUMENT, { headers: { 'content-type': 'application/schema+json' } });
