import { peopleList } from '$lib/server/lists/people';
import { listRoute } from '$lib/server/lists/list';

export const GET = listRoute(peopleList);
