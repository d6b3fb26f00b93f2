/** Finds PostgreSQL's programs on this machine, or fetches them beside the data. */
export function findPostgres(
	dataFolder: string
): Promise<{ binaries: string; environment?: Record<string, string> }>;
