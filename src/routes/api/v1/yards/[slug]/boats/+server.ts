import { boatList } from '$lib/server/lists/boats';
import { listRoute } from '$lib/server/lists/list';

export const GET = listRoute(boatList);
