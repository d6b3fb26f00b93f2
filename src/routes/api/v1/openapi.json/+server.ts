import { json } from '@sveltejs/kit';
import { openApiDocument } from '$lib/api/openapi/document';
import { api } from '$lib/server/http/problem';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = api(() => Promise.resolve(json(openApiDocument())));
