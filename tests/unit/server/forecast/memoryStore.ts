import type { ForecastRun } from '../../../../src/lib/server/db/schema';
import { prunable } from '../../../../src/lib/server/forecast/retention';
import type { ForecastStore, ProviderState } from '../../../../src/lib/server/forecast/store';

/** A store in memory with the promises of the real one: locking, all or nothing. */
export function memoryStore() {
	let runs: ForecastRun[] = [];
	let states: ProviderState[] = [];
	const locked = new Set<string>();
	const newestFirst = (yardId: string) =>
		runs
			.filter((run) => run.yardId === yardId)
			.sort((a, b) => b.fetchedAt.getTime() - a.fetchedAt.getTime());

	const store: ForecastStore = {
		async withYardLock(yardId, work) {
			if (locked.has(yardId)) return null;
			locked.add(yardId);
			const before = { runs: [...runs], states: [...states] };
			try {
				return await work(store);
			} catch (error) {
				({ runs, states } = before);
				throw error;
			} finally {
				locked.delete(yardId);
			}
		},
		states: (yardId) => Promise.resolve(states.filter((state) => state.yardId === yardId)),
		saveState(state) {
			states = [
				...states.filter((s) => s.yardId !== state.yardId || s.provider !== state.provider),
				state
			];
			return Promise.resolve();
		},
		latestRuns: (yardId) =>
			Promise.resolve(
				newestFirst(yardId).filter(
					(run, i, all) => all.findIndex(({ provider }) => provider === run.provider) === i
				)
			),
		run: (runId) => Promise.resolve(runs.find(({ id }) => id === runId) ?? null),
		members: (runId) => Promise.resolve(runs.find(({ id }) => id === runId)?.members ?? null),
		earlierRuns: (yardId, since, before, limit) =>
			Promise.resolve(
				newestFirst(yardId)
					.filter(({ issuedAt, fetchedAt }) => issuedAt >= since && fetchedAt < before)
					.slice(0, limit)
			),
		addRun(run) {
			const id = `run-${runs.length + 1}`;
			runs = [...runs, { ...run, id, memberCount: run.members?.length ?? 0 }];
			return Promise.resolve(id);
		},
		prune(yardId, now) {
			const gone = (['open-meteo', 'met-norway'] as const).flatMap((name) =>
				prunable(
					newestFirst(yardId).filter(({ provider }) => provider === name),
					now
				)
			);
			runs = runs.filter((run) => !gone.includes(run));
			return Promise.resolve();
		},
		forget(yardId) {
			runs = runs.filter((run) => run.yardId !== yardId);
			states = states.filter((state) => state.yardId !== yardId);
			return Promise.resolve();
		}
	};
	return { store, runs: () => runs, states: () => states };
}
