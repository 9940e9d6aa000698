/** What is wrong with an entry of the audit trail, for whoever has to look into it. */
const chainWords: Record<string, string> = {
	'entry-changed': 'the entry was changed after it was written',
	'entry-missing': 'the entry is gone, though later ones are there',
	'not-following': 'the entry does not follow the one before it: one was put in, replaced or moved',
	'payload-changed': 'what the entry says was changed after it was written',
	'payload-missing': 'what the entry says is gone',
	'payload-blanked': 'what the entry says was blanked, and no retention run says so',
	'tail-missing': 'this entry and all after it are gone',
	'entry-added': 'the entry stands behind the chain’s end: it was not written by the program',
	'head-missing': 'the chain’s head is gone',
	'head-differs': 'the chain’s head names another last entry',
	'checkpoint-differs': 'the entry is not the one that a checkpoint took note of: the chain was written anew'
};

const checkpointWords: Record<string, string> = {
	'checkpoint-changed': 'was changed after it was made',
	'checkpoint-missing': 'is gone, though a later one is known',
	'checkpoint-not-as-known': 'is not the one that was noted elsewhere'
};

/** `PS-26-1184, entry 7: …` */
export function chainFaultText({ about, seq, fault }: { about: string; seq: number; fault: string }): string {
	return `${about}, entry ${seq}: ${chainWords[fault] ?? fault}`;
}

export function checkpointFaultText({ checkpoint, fault }: { checkpoint: number; fault: string }): string {
	return `checkpoint ${checkpoint} ${checkpointWords[fault] ?? fault}`;
}

export function unrecordedText({ docket, version }: { docket: string; version: number }): string {
	return `${docket}: version ${version} is signed, and the docket’s chain has no entry of it`;
}
