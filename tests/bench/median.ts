/** Median time of so many runs of some work, in milliseconds; warmed up by a quarter as many before. */
export function median(runs: number, work: () => unknown): number {
	for (let i = 0; i < runs / 4; i++) work();
	const times = Array.from({ length: runs }, () => {
		const from = performance.now();
		work();
		return performance.now() - from;
	});
	return times.sort((a, b) => a - b)[runs >> 1];
}
