import { z } from 'zod';
import { jsonBody } from './body';
import { ApiProblem, invalid } from './problem';

const MOST_BYTES = 256 * 1024;

/** The JSON body of a request by a schema; a 400 that names each field it refuses. */
export async function parsedBody<Shape extends z.ZodType>(
	request: Request,
	schema: Shape
): Promise<z.output<Shape>> {
	const parsed = schema.safeParse(await jsonBody(request, MOST_BYTES));
	if (!parsed.success) throw invalid(parsed.error);
	return parsed.data;
}

/** The query of an address by a schema. */
export function parsedQuery<Shape extends z.ZodType>(url: URL, schema: Shape): z.output<Shape> {
	const parsed = schema.safeParse(Object.fromEntries(url.searchParams));
	if (!parsed.success) throw invalid(parsed.error);
	return parsed.data;
}

/** An id of an address; what is none is not there. */
export function parsedId(text: string | undefined): string {
	const id = z.uuid().safeParse(text);
	if (!id.success) throw new ApiProblem(404, 'There is none such.');
	return id.data;
}
