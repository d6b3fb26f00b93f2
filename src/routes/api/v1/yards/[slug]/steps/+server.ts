import { stepList } from '$lib/server/lists/steps';
import { listRoute } from '$lib/server/lists/list';

export const GET = listRoute(stepList);
