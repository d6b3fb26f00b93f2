/** An instant (UTC epoch seconds) as ISO 8601 in UTC. */
export function instantText(epochSeconds: number): string {
	return new Date(epochSeconds * 1000).toISOString();
}
