import { sendFile } from '$lib/api/client/upload';
import { ApiFailure } from '$lib/api/client/request';
import { MOST_FILE_BYTES } from '$lib/api/files';

/** One file on its way. */
export interface Way {
	/** The same however often it is tried, so that it is kept once. */
	readonly id: string;
	readonly file: File;
	readonly caption: string;
	state: 'waiting' | 'going' | 'kept' | 'failed';
	/** Gone so far, 0 to 1. */
	share: number;
	/** Why it failed. */
	why: string;
	/** Whether trying again may help: the file itself was not refused. */
	again: boolean;
}

/** Files being sent to one place, one after the other, in the order they were chosen. */
export class Sending {
	ways = $state<Way[]>([]);
	#running = false;

	/**
	 * @param path - where files are sent
	 * @param onkept - told after each that is kept
	 */
	constructor(
		readonly path: () => string,
		readonly onkept: () => Promise<void>
	) {}

	get busy(): boolean {
		return this.ways.some(({ state }) => state === 'waiting' || state === 'going');
	}

	add(files: readonly File[], caption: string): void {
		// What has been kept is seen among the files; what failed stays until it is tried again.
		this.ways = [
			...this.ways.filter(({ state }) => state !== 'kept'),
			...files.map((file): Way => {
				const large = file.size > MOST_FILE_BYTES;
				return {
					id: crypto.randomUUID(),
					file,
					caption,
					state: large ? 'failed' : 'waiting',
					share: 0,
					why: large
						? `${file.name} is larger than ${MOST_FILE_BYTES / 1_000_000} MB, the most a photo may have.`
						: '',
					again: false
				};
			})
		];
		void this.#run();
	}

	retry(id: string): void {
		const way = this.ways.find((it) => it.id === id);
		if (way === undefined) return;
		Object.assign(way, { state: 'waiting', share: 0, why: '' });
		void this.#run();
	}

	forget(id: string): void {
		this.ways = this.ways.filter((it) => it.id !== id);
	}

	async #run(): Promise<void> {
		if (this.#running) return;
		this.#running = true;
		for (;;) {
			const way = this.ways.find(({ state }) => state === 'waiting');
			if (way === undefined) break;
			way.state = 'going';
			const { id, file, caption } = way;
			const about = { id, name: file.name.slice(-400), caption };
			try {
				await sendFile(this.path(), about, file, (share) => (way.share = share));
				way.state = 'kept';
				await this.onkept();
			} catch (error) {
				const status = error instanceof ApiFailure ? error.status : null;
				way.state = 'failed';
				way.again = status === null || status >= 500;
				way.why =
					status === null
						? `${way.file.name} did not arrive: no answer came.`
						: error instanceof Error
							? error.message
							: '';
			}
		}
		this.#running = false;
	}
}
