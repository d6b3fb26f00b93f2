import { execFileSync, spawnSync } from 'node:child_process';
import { chmodSync, chownSync, mkdirSync } from 'node:fs';

/** The account that runs PostgreSQL when this process is root: the server refuses to run as root. */
const DATABASE_ACCOUNT = 'postgres';

export const isRoot = process.getuid?.() === 0;

/** The words that run a command as the database account: none when not root. */
export function asDatabaseAccount() {
	return isRoot ? ['runuser', '-u', DATABASE_ACCOUNT, '--'] : [];
}

/** Whether the database account can reach a folder (each parent must let it pass). */
export function reachable(folder) {
	if (!isRoot) return true;
	return spawnSync('runuser', ['-u', DATABASE_ACCOUNT, '--', 'test', '-x', folder]).status === 0;
}

/** Makes a folder that only the database account may enter. */
export function makePrivateFolder(folder) {
	mkdirSync(folder, { recursive: true });
	if (isRoot) {
		const [uid, gid] = ['-u', '-g'].map((flag) =>
			Number(execFileSync('id', [flag, DATABASE_ACCOUNT], { encoding: 'utf8' }))
		);
		chownSync(folder, uid, gid);
	}
	chmodSync(folder, 0o700);
}
