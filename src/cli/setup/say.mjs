/** Progress on the terminal: one line a step, with its seconds when it ends. */

/** Where progress goes. */
/** @type {NodeJS.WriteStream} */
let out = process.stdout;

/** Programs whose standard output is their answer have their progress elsewhere. */
export function sayOnStandardError() {
	out = process.stderr;
}

/** @param {string} text */
export function say(text) {
	out.write(`${text}\n`);
}

/**
 * Runs one step, saying what it does and how long it took.
 * @template T
 * @param {string} name
 * @param {() => T | Promise<T>} work
 * @returns {Promise<T>}
 */
export async function step(name, work) {
	const startedMs = performance.now();
	out.write(`· ${name} …`);
	if (!out.isTTY) out.write('\n');
	const result = await work();
	const seconds = ((performance.now() - startedMs) / 1000).toFixed(1);
	out.write(out.isTTY ? ` ${seconds} s\n` : `  ${name}: ${seconds} s\n`);
	return result;
}

/** A failure the user can act on: what failed and what to do. Printed without a stack. */
export class SetupFault extends Error {}

/**
 * Ends the program with the fault in words.
 * @param {unknown} error
 * @returns {never}
 */
export function endWith(error) {
	const text =
		error instanceof SetupFault ? error.message : error instanceof Error ? error.stack : String(error);
	process.stderr.write(`\n✗ ${text}\n`);
	process.exit(1);
}
