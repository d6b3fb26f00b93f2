import { stepList } from '$lib/server/lists/steps';
import { csvRoute } from '$lib/server/lists/list';

export const GET = csvRoute(stepList);
