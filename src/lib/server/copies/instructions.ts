/** What stands beside a copy: what it holds and how somebody without this program checks it. */
export function instructions(docket: string, takenAt: string, takenBy: string): string {
	return `Copy of docket ${docket}
Taken ${takenAt} (UTC) by ${takenBy}

WHAT IS IN IT
records.json          every record of the docket, and what those point at, a table a list
records/*.csv         the same, a table a file (UTF-8, RFC 4180; a text that begins like a formula has a ' before it)
decisions/*.json      each signed decision as it was frozen at its signature, byte for byte
*.pdf                 the sealed receiving report of each version
exports/              logger exports as they were uploaded, byte for byte
readings/*.csv        the readings taken from them
photographs/          photographs taken at the door
notes/                files attached to notes, byte for byte
files/                every other file the records name, under its SHA-256: papers of a claim, a driver's signature
audit/entries.jsonl   the docket's audit trail, an entry a line, oldest first; audit/entries.csv is the same
audit/head.json       where that trail ends, and the checkpoints over all trails that took note of it
manifest.json         each file with its size and SHA-256

HOW TO CHECK IT
1. All of it at once, with Node 18 or newer and nothing else:   node verify.mjs
2. The files by hand:                                           sha256sum -c SHA256SUMS
3. The seal of a report: open the PDF in a reader that checks signatures, or   pdfsig report.pdf
4. The trail by hand. Join these fields of an entry by line feeds and take the SHA-256 of the UTF-8 text:
   chainId, seq, type, actorId (empty where null), actorKind, occurredAt, requestId, address, payloadSha256,
   previousSha256, and sessionKind where it is not null. It is the entry's sha256. previousSha256 is the sha256 of
   the entry before; the first has 64 zeros. payloadSha256 is the SHA-256 of the payload's text, as it stands there.
   A payload that is null was blanked by retention; a later entry of the type retention.blanked names it.
5. A checkpoint's number and hash can be compared with those the keeper wrote down elsewhere.

Times are UTC. Who did something stands in the trail by id; records.json has names.
`;
}
