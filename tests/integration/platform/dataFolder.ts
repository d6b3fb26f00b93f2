import { chmodSync, existsSync, mkdtempSync, symlinkSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

/** A folder that the database's account can enter, with the programs the run has already fetched. */
export function newDataFolder(): string {
	const folder = mkdtempSync(join(tmpdir(), 'yardglass-platform-'));
	chmodSync(folder, 0o755);
	const packages = join(process.env.STACK_DATA_DIR ?? '/nonexistent', 'packages');
	if (existsSync(packages)) symlinkSync(packages, join(folder, 'packages'));
	return folder;
}
