/** One line to whoever started the command. */
export function say(line) {
	process.stdout.write(`${line}\n`);
}
