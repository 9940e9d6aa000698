import { readdirSync, readFileSync, statSync } from 'node:fs';
import { dirname, join, normalize, relative } from 'node:path';
import ts from 'typescript';
import { describe, expect, it } from 'vitest';

const root = join(import.meta.dirname, '..');

function filesBelow(folder: string): string[] {
	return readdirSync(join(root, folder)).flatMap((name) => {
		const path = join(folder, name);
		return statSync(join(root, path)).isDirectory() ? filesBelow(path) : [path];
	});
}

const sources = filesBelow('src').filter(
	(path) => /\.(ts|mjs|svelte)$/.test(path) && !path.endsWith('.d.ts')
);
const isTest = (path: string) => /\.test\.ts$/.test(path);
const product = sources.filter((path) => !isTest(path));

/** The layer a file belongs to; a file that belongs to none fails the test that asks. */
const layers = [
	['domain', /^src\/lib\/domain\//],
	['messages', /^src\/lib\/messages\//],
	['schemas', /^src\/lib\/schemas\//],
	['format', /^src\/lib\/(format|format-time|api)\.ts$/],
	['components', /^src\/lib\/components\//],
	['server', /^src\/lib\/server\//],
	['routes', /^src\/(routes|params|hooks\.)/],
	['cli', /^src\/cli\//]
] as const;
type Layer = (typeof layers)[number][0];

const layerOf = (path: string): Layer | null => layers.find(([, pattern]) => pattern.test(path))?.[0] ?? null;

/** Which layers a layer may know. Every direction not named here is forbidden, also for types. */
const mayImport: Record<Layer, readonly Layer[]> = {
	domain: ['domain'],
	format: ['domain', 'format', 'schemas'],
	messages: ['domain', 'format', 'messages', 'schemas'],
	schemas: ['domain', 'format', 'schemas'],
	components: ['domain', 'schemas', 'format', 'messages', 'components'],
	server: ['domain', 'schemas', 'format', 'messages', 'server'],
	routes: ['domain', 'schemas', 'format', 'messages', 'components', 'server', 'routes'],
	cli: ['domain', 'schemas', 'format', 'messages', 'server', 'cli']
};

/** Packages that `domain` may use: those that run in a browser unchanged and touch no clock, disk or network. */
const domainPackages = /^(csv-parse|luxon|@exodus\/bytes|fflate|@noble\/hashes)/;

interface Import {
	from: string;
	specifier: string;
	target: string | null;
}

function scriptOf(path: string): string {
	const text = readFileSync(join(root, path), 'utf8');
	if (!path.endsWith('.svelte')) return text;
	return [...text.matchAll(/<script[^>]*>([\s\S]*?)<\/script>/g)].map((match) => match[1]).join('\n');
}

function importsOf(path: string): Import[] {
	return ts.preProcessFile(scriptOf(path), true, true).importedFiles.map(({ fileName: specifier }) => {
		const local = specifier.startsWith('$lib/')
			? specifier.replace('$lib/', 'src/lib/')
			: specifier.startsWith('.')
				? normalize(join(dirname(path), specifier))
				: null;
		return { from: path, specifier, target: local };
	});
}

const imports = product.flatMap(importsOf);

describe('the map of the code', () => {
	it('has a layer for every source file', () => {
		expect(product.filter((path) => layerOf(path) === null && !/^src\/app\./.test(path))).toEqual([]);
	});

	it('lets imports run in one direction only', () => {
		const wrong = imports.filter(({ from, target }) => {
			const [own, other] = [
				layerOf(from),
				target ? layerOf(target.endsWith('.svelte') ? target : `${target.replace(/\.ts$/, '')}.ts`) : null
			];
			return own && other && !mayImport[own].includes(other);
		});
		expect(wrong.map(({ from, specifier }) => `${from} → ${specifier}`)).toEqual([]);
	});

	it('keeps domain free of frameworks, Node, clocks and chance', () => {
		const foreign = imports.filter(
			({ from, specifier, target }) =>
				layerOf(from) === 'domain' && target === null && !domainPackages.test(specifier)
		);
		expect(foreign.map(({ from, specifier }) => `${from} → ${specifier}`)).toEqual([]);
		const banned =
			/\bDate\.now\(|\bMath\.(random|exp|log|log2|log10|log1p|expm1|pow|sinh|cosh|tanh)\b|\bnew Date\(\)|\bprocess\.|\bfetch\(/;
		const using = product.filter(
			(path) =>
				layerOf(path) === 'domain' && banned.test(scriptOf(path).replace(/\/\*[\s\S]*?\*\/|\/\/.*/g, ''))
		);
		expect(using).toEqual([]);
		// The engines' own decoders differ; the one from the package is the same everywhere.
		const decoding = product.filter(
			(path) => layerOf(path) === 'domain' && /\bTextDecoder\b/.test(scriptOf(path))
		);
		expect(
			decoding.filter(
				(path) => !importsOf(path).some(({ specifier }) => specifier.startsWith('@exodus/bytes'))
			)
		).toEqual([]);
	});

	it('keeps use cases free of the web framework', () => {
		const edge = /^src\/lib\/server\/(hooks\/|request\.ts|file-response\.ts|accounts\/auth\.ts)/;
		const wrong = imports.filter(
			({ from, specifier }) =>
				layerOf(from) === 'server' && !edge.test(from) && /^(@sveltejs|\$app|\$env|svelte)/.test(specifier)
		);
		expect(wrong.map(({ from, specifier }) => `${from} → ${specifier}`)).toEqual([]);
	});

	it('lets only the server touch the models', () => {
		const wrong = imports.filter(
			({ from, target }) => target?.includes('server/db/models') && layerOf(from) !== 'server'
		);
		expect(wrong.map(({ from, specifier }) => `${from} → ${specifier}`)).toEqual([]);
	});

	it('writes to the terminal from programs only', () => {
		expect(
			product.filter(
				(path) => layerOf(path) !== 'cli' && /\bconsole\.(log|warn|error|info|debug)\(/.test(scriptOf(path))
			)
		).toEqual([]);
	});
});

/** The functions a file exports as handlers: HTTP methods of +server.ts, entries of `actions`. */
function handlersOf(path: string): { name: string; text: string }[] {
	const file = ts.createSourceFile(
		path,
		readFileSync(join(root, path), 'utf8'),
		ts.ScriptTarget.Latest,
		true
	);
	const found: { name: string; text: string }[] = [];
	const local = new Map(
		file.statements.filter(ts.isFunctionDeclaration).map((f) => [f.name?.text ?? '', f.getText()])
	);
	/** An action made by a function of the same file is read with that function. */
	const withMaker = (property: ts.ObjectLiteralElementLike): string => {
		const maker =
			ts.isPropertyAssignment(property) && ts.isCallExpression(property.initializer)
				? local.get(property.initializer.expression.getText())
				: undefined;
		return `${property.getText()}\n${maker ?? ''}`;
	};
	const unwrap = (node: ts.Expression): ts.Expression =>
		ts.isSatisfiesExpression(node) || ts.isParenthesizedExpression(node) || ts.isAsExpression(node)
			? unwrap(node.expression)
			: node;
	for (const statement of file.statements) {
		if (
			!ts.isVariableStatement(statement) ||
			!statement.modifiers?.some((m) => m.kind === ts.SyntaxKind.ExportKeyword)
		) {
			if (
				ts.isFunctionDeclaration(statement) &&
				statement.name &&
				/^(GET|POST|PUT|PATCH|DELETE|fallback|load)$/.test(statement.name.text)
			)
				found.push({ name: statement.name.text, text: statement.getText() });
			continue;
		}
		for (const declaration of statement.declarationList.declarations) {
			const name = declaration.name.getText();
			const value = declaration.initializer ? unwrap(declaration.initializer) : null;
			if (!value) continue;
			if (name === 'actions' && ts.isObjectLiteralExpression(value))
				for (const property of value.properties)
					found.push({ name: `actions.${property.name?.getText()}`, text: withMaker(property) });
			else if (/^(GET|POST|PUT|PATCH|DELETE|fallback|load)$/.test(name))
				found.push({ name, text: value.getText() });
		}
	}
	return found;
}

/** Handlers that answer without a session, each with its reason. */
const open: Record<string, string> = {
	'src/routes/api/v1/health/+server.ts GET': 'tells a balancer whether the process is well, and nothing else'
};

describe('every handler asks who is calling', () => {
	const guarded = product.filter((path) =>
		/^src\/routes\/(?!\(public\)).*\+(page|layout)?\.?server\.ts$/.test(path)
	);

	it('finds the handlers it is to check', () => {
		expect(guarded.flatMap(handlersOf).length).toBeGreaterThan(40);
	});

	it('calls contextOf in each load, action and method outside the public group', () => {
		const silent = guarded.flatMap((path) =>
			handlersOf(path)
				.filter(({ text }) => !/\bcontextOf\(/.test(text))
				.map(({ name }) => `${path} ${name}`)
		);
		expect(silent.filter((handler) => !(handler in open))).toEqual([]);
	});

	it('calls it before anything is read or done', () => {
		const late = guarded.flatMap((path) =>
			handlersOf(path)
				.filter(
					({ text }) =>
						/\bcontextOf\(/.test(text) &&
						/\b(parseForm|formData|request\.json|inTransaction)\b/.test(text.split('contextOf(')[0] ?? '')
				)
				.map(({ name }) => `${path} ${name}`)
		);
		expect(late).toEqual([]);
	});

	it('keeps no excuse for a handler that is gone', () => {
		const known = new Set(guarded.flatMap((path) => handlersOf(path).map(({ name }) => `${path} ${name}`)));
		expect(Object.keys(open).filter((handler) => !known.has(handler))).toEqual([]);
	});
});

describe('the folder of the project', () => {
	it('holds nothing at its top but what a newcomer expects', () => {
		const expected = new Set([
			'src',
			'static',
			'tests',
			'sample-uploads',
			'package.json',
			'package-lock.json',
			'svelte.config.js',
			'vite.config.ts',
			'tailwind.config.ts',
			'tsconfig.json',
			'README.md',
			'DEVELOPERS.md',
			'node_modules',
			'build'
		]);
		expect(
			readdirSync(root).filter(
				(name) => !name.startsWith('.') && !expected.has(name) && !/\.timestamp-/.test(name)
			)
		).toEqual([]);
	});

	it('keeps files short enough to read', () => {
		const long = product.filter(
			(path) =>
				/\.(ts|svelte|mjs)$/.test(path) && readFileSync(join(root, path), 'utf8').split('\n').length > 301
		);
		expect(long.map((path) => relative(root, join(root, path)))).toEqual([]);
	});
});
