/** Half a digest is enough to name a record and short enough to type; a whole one may be a file's. */
const code = /^[0-9a-f]{16,64}$/u;
/** What people type for the digits they see. */
const lookalikes: Readonly<Record<string, string>> = { o: '0', i: '1', l: '1' };

/** A report's code as typed, pasted with its address or scanned; null where it cannot be one. */
export function reportCode(typed: string): string | null {
	const last =
		typed
			.trim()
			.replace(/[?#].*$/u, '')
			.split('/')
			.filter(Boolean)
			.at(-1) ?? '';
	const digits = last
		.normalize('NFKC')
		.toLowerCase()
		.replace(/[\s\p{Pd}\p{Cf}.:,]/gu, '')
		.replace(/[oil]/gu, (letter) => lookalikes[letter] ?? letter);
	return code.test(digits) ? digits : null;
}
