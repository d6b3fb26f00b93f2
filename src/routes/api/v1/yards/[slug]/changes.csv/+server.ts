import { changeList } from '$lib/server/lists/changes';
import { csvRoute } from '$lib/server/lists/list';

export const GET = csvRoute(changeList);
