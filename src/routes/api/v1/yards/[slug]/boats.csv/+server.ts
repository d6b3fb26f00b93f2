import { boatList } from '$lib/server/lists/boats';
import { csvRoute } from '$lib/server/lists/list';

export const GET = csvRoute(boatList);
