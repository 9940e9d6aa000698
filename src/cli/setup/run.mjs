import { spawn } from 'node:child_process';
import { SetupFault } from './say.mjs';

/**
 * Runs a program to its end, keeping its output for the case that it fails.
 * @param {string} program
 * @param {string[]} args
 * @param {{ cwd?: string, env?: NodeJS.ProcessEnv, shows?: boolean, whatToDo?: string }} [options]
 * @returns {Promise<string>} what it printed
 */
export function run(program, args, options = {}) {
	return new Promise((resolve, reject) => {
		const child = spawn(program, args, {
			cwd: options.cwd,
			env: options.env ?? process.env,
			stdio: ['ignore', options.shows ? 'inherit' : 'pipe', options.shows ? 'inherit' : 'pipe']
		});
		let output = '';
		child.stdout?.on('data', (chunk) => (output += chunk));
		child.stderr?.on('data', (chunk) => (output += chunk));
		child.on('error', (error) => reject(new SetupFault(`${program} could not be started: ${error.message}`)));
		child.on('close', (code) => {
			if (code === 0) return resolve(output);
			const tail = output.trim().split('\n').slice(-15).join('\n');
			const advice = options.whatToDo ? `\n${options.whatToDo}` : '';
			reject(new SetupFault(`${program} ${args.join(' ')} ended with ${code}.\n${tail}${advice}`));
		});
	});
}
