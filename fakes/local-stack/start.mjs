import { resolve } from 'node:path';
import { ensureDependencies, ROOT } from './project.mjs';
import { say } from './say.mjs';

/** `npm start` and, with --dev, `npm run dev`: everything on this machine, until Ctrl-C. */
async function main() {
	await ensureDependencies();
	// After the install: the stack itself needs nothing of it, what it starts does.
	const { startStack } = await import('./stack.mjs');
	const dataFolder = resolve(ROOT, process.env.DATA_DIR || '.local');
	const stack = await startStack({
		dataFolder,
		port: process.env.PORT || undefined,
		dev: process.argv.includes('--dev')
	});
	let stopping = false;
	const stop = async (code) => {
		if (stopping) return;
		stopping = true;
		await stack.stop();
		process.exit(code);
	};
	for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => void stop(0));
	stack.death.catch((error) => {
		process.stderr.write(`${error.message}\n`);
		void stop(1);
	});
	if (stack.fakes.mail !== undefined) say(`Mail is kept at ${stack.fakes.mail}`);
	if (stack.fakes.forecast !== undefined) say(`The weather is made up at ${stack.fakes.forecast}`);
	for (const { role, email, password } of stack.accounts) say(`demo ${role} ${email} ${password}`);
	say(`READY ${stack.origin}`);
}

main().catch((error) => {
	process.stderr.write(`${error.message}\n`);
	process.exit(1);
});
