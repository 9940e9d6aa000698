import { readdirSync } from 'node:fs';
import { basename, join } from 'node:path';
import { sveltekit } from '@sveltejs/kit/vite';
import tailwindcss from '@tailwindcss/vite';
import { defineConfig, type ViteUserConfig as UserConfig } from 'vitest/config';

const lib = join(import.meta.dirname, 'src/lib');

/** Programs that run outside a request: every TypeScript file of src/cli, and the workers. */
function nodePrograms(): Record<string, string> {
	const found: Record<string, string> = {};
	for (const folder of ['src/cli', 'src/lib/server/workers']) {
		for (const file of readdirSync(folder).filter(
			(name) => name.endsWith('.ts') && !name.endsWith('.test.ts')
		)) {
			found[basename(file, '.ts')] = join(folder, file);
		}
	}
	return found;
}

/** Kit's server build leaves worker URLs unresolved, so those programs get a build of their own. */
const nodeBuild: UserConfig = {
	publicDir: false,
	resolve: { alias: { $lib: lib } },
	build: {
		ssr: true,
		outDir: 'build/node',
		emptyOutDir: true,
		target: 'node20',
		rollupOptions: {
			input: nodePrograms(),
			output: { entryFileNames: '[name].js', chunkFileNames: 'chunks/[name]-[hash].js' }
		}
	}
};

/** Tests against the private database share two cores with it: few workers, one database each. */
const tests: UserConfig['test'] = {
	maxWorkers: 2,
	// A busy machine is no fault of the code: what must be fast is measured, not timed out.
	testTimeout: 60_000,
	projects: [
		{
			extends: true,
			test: {
				name: 'unit',
				// Pure code keeps nothing between files: it is loaded once a worker, not once a file.
				isolate: false,
				include: [
					'src/lib/domain/**/*.test.ts',
					'src/lib/*.test.ts',
					'src/lib/{schemas,messages}/**/*.test.ts',
					'tests/{accuracy,fuzz}/**/*.test.ts',
					'tests/*.test.ts'
				]
			}
		},
		{
			extends: true,
			test: {
				name: 'server',
				include: ['src/lib/server/**/*.test.ts', 'src/cli/**/*.test.ts'],
				globalSetup: ['tests/helpers/database-server.ts'],
				hookTimeout: 60_000
			}
		},
		{
			extends: true,
			test: {
				name: 'handlers',
				include: ['tests/handlers/**/*.test.ts'],
				globalSetup: ['tests/helpers/database-server.ts'],
				hookTimeout: 60_000
			}
		},
		{
			extends: true,
			resolve: { conditions: ['browser'] },
			test: {
				name: 'components',
				include: ['src/lib/components/**/*.test.ts', 'src/routes/**/*.test.ts'],
				environment: 'happy-dom'
			}
		}
	]
};

export default defineConfig(({ mode }) =>
	mode === 'node'
		? nodeBuild
		: { plugins: [tailwindcss(), sveltekit()], test: tests, server: { host: '127.0.0.1' } }
);
