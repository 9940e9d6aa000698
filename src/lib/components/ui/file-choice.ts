export interface RefusedFile {
	file: File;
	reason: 'too-large' | 'empty';
}

export interface FileChoice {
	taken: File[];
	refused: RefusedFile[];
}

/** What of a drop can be sent: the rest is told at once, before the dock's slow network is spent on it. */
export function sortFiles(files: readonly File[], maxBytes: number, isMultiple: boolean): FileChoice {
	const choice: FileChoice = { taken: [], refused: [] };
	for (const file of isMultiple ? files : files.slice(0, 1)) {
		if (file.size === 0) choice.refused.push({ file, reason: 'empty' });
		else if (file.size > maxBytes) choice.refused.push({ file, reason: 'too-large' });
		else choice.taken.push(file);
	}
	return choice;
}
