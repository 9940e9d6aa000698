import { spawn } from 'node:child_process';

/**
 * Runs a built program in this one's place: same arguments, streams and folder, and it ends with its code.
 * @param {string} program
 * @param {NodeJS.ProcessEnv} env
 * @returns {Promise<void>}
 */
export function runProgram(program, env) {
	return new Promise((resolve, reject) => {
		const child = spawn(process.execPath, [program, ...process.argv.slice(2)], { env, stdio: 'inherit' });
		child.on('error', reject);
		child.on('close', (code) => {
			process.exitCode = code ?? 1;
			resolve();
		});
	});
}
