import { peopleList } from '$lib/server/lists/people';
import { csvRoute } from '$lib/server/lists/list';

export const GET = csvRoute(peopleList);
