import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { coverageOf } from './glyph-coverage';

const require = createRequire(import.meta.url);

export type Family = 'Barlow' | 'Semi' | 'Mono' | 'Noto';

/** Full TrueType faces: the web's Latin subsets lack ő, Ł, ≤ and Δ. */
const faces: Record<Exclude<Family, 'Noto'>, readonly [string, string]> = {
	Barlow: ['barlow/400Regular/Barlow_400Regular.ttf', 'barlow/600SemiBold/Barlow_600SemiBold.ttf'],
	Semi: [
		'barlow-semi-condensed/500Medium/BarlowSemiCondensed_500Medium.ttf',
		'barlow-semi-condensed/600SemiBold/BarlowSemiCondensed_600SemiBold.ttf'
	],
	Mono: [
		'roboto-mono/400Regular/RobotoMono_400Regular.ttf',
		'roboto-mono/600SemiBold/RobotoMono_600SemiBold.ttf'
	]
};
/** Only where it is installed: the last resort before the replacement mark. */
const noto = [
	'noto-sans/400Regular/NotoSans_400Regular.ttf',
	'noto-sans/600SemiBold/NotoSans_600SemiBold.ttf'
] as const;

export interface FontFiles {
	readonly normal: string;
	readonly bold: string;
}

function filesOf([normal, bold]: readonly [string, string]): FontFiles {
	return {
		normal: require.resolve(`@expo-google-fonts/${normal}`),
		bold: require.resolve(`@expo-google-fonts/${bold}`)
	};
}

function notoFiles(): FontFiles | null {
	try {
		return filesOf(noto);
	} catch (error) {
		if (error instanceof Error && 'code' in error && error.code === 'MODULE_NOT_FOUND') return null;
		throw error;
	}
}

/** Paths of the faces by family; `Noto` only where its package is installed. */
export const fontFiles: Readonly<Partial<Record<Family, FontFiles>>> = (() => {
	const own = { Barlow: filesOf(faces.Barlow), Semi: filesOf(faces.Semi), Mono: filesOf(faces.Mono) };
	const last = notoFiles();
	return last === null ? own : { ...own, Noto: last };
})();

const covered = new Map<Family, ReadonlySet<number>>();

/** Whether the family's regular face draws this code point. */
export function draws(family: Family, codePoint: number): boolean {
	const files = fontFiles[family];
	if (files === undefined) return false;
	const known = covered.get(family) ?? coverageOf(readFileSync(files.normal));
	covered.set(family, known);
	return known.has(codePoint);
}
