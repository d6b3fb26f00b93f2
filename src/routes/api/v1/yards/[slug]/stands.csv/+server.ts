import { standList } from '$lib/server/lists/stands';
import { csvRoute } from '$lib/server/lists/list';

export const GET = csvRoute(standList);
