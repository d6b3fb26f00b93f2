import { changeList } from '$lib/server/lists/changes';
import { listRoute } from '$lib/server/lists/list';

export const GET = listRoute(changeList);
