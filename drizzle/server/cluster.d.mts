export interface Cluster {
	/** Connection string of the maintenance database. */
	readonly url: string;
	readonly urlOf: (database: string) => string;
	/** The same for the web process's role. */
	readonly webUrlOf: (database: string) => string;
	readonly stop: () => Promise<void>;
}

export function startCluster(options: {
	dataFolder: string;
	binaries: string;
	environment?: Record<string, string>;
	throwAway?: boolean;
	port?: number;
}): Promise<Cluster>;
