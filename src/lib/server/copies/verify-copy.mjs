// Verifies a copy of a docket: node verify.mjs, in the folder it was unpacked to. Needs Node 18 or newer, nothing else.
import { createHash } from 'node:crypto';
import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';

const folder = process.argv[2] ?? '.';
const read = (name) => readFileSync(join(folder, name));
const text = (name) => read(name).toString('utf8');
const sha256 = (bytes) => createHash('sha256').update(bytes).digest('hex');
const faults = [];
const say = (line) => process.stdout.write(`${line}\n`);

// 1. Every file is what it was when the copy was taken.
const sums = text('SHA256SUMS').split('\n').filter(Boolean);
for (const line of sums) {
	const [sum, name] = [line.slice(0, 64), line.slice(66)];
	if (!existsSync(join(folder, name))) faults.push(`${name} is missing`);
	else if (sha256(read(name)) !== sum) faults.push(`${name} is not what was written`);
}

// 2. The audit trail is whole: each entry names the hash of the one before, and the last is the chain's head.
const blanked = [];
const declared = [];
function entryFault(entry, seq, previous) {
	if (entry.seq !== seq) return 'is missing';
	const covered = [
		entry.chainId,
		entry.seq,
		entry.type,
		entry.actorId ?? '',
		entry.actorKind,
		entry.occurredAt,
		entry.requestId,
		entry.address,
		entry.payloadSha256,
		entry.previousSha256,
		...(entry.sessionKind === null ? [] : [entry.sessionKind])
	].join('\n');
	if (sha256(covered) !== entry.sha256) return 'was changed';
	if (entry.previousSha256 !== previous) return 'does not follow the one before it';
	if (entry.payload === null) blanked.push(seq);
	else if (sha256(entry.payload) !== entry.payloadSha256) return 'says something else than was written';
	if (entry.type === 'retention.blanked' && entry.payload)
		for (const [, from, to] of JSON.parse(entry.payload).entries.matchAll(/(\d+)(?:-(\d+))?/g))
			declared.push([Number(from), Number(to ?? from)]);
	return null;
}

const head = JSON.parse(text('audit/head.json'));
const entries = text('audit/entries.jsonl')
	.split('\n')
	.filter(Boolean)
	.map((line) => JSON.parse(line));
let previous = '0'.repeat(64);
let chainFault = null;
const known = new Map(head.checkpoints.map((checkpoint) => [checkpoint.length, checkpoint]));
for (const [index, entry] of entries.entries()) {
	chainFault = entryFault(entry, index + 1, previous);
	const checkpoint = known.get(index + 1);
	if (!chainFault && checkpoint && checkpoint.headSha256 !== entry.sha256)
		chainFault = `is not the one that checkpoint ${checkpoint.seq} took note of`;
	if (chainFault) {
		faults.push(`audit entry ${index + 1} ${chainFault}`);
		break;
	}
	previous = entry.sha256;
}
if (!chainFault && (entries.length !== head.length || previous !== head.headSha256))
	faults.push(
		`audit entry ${Math.min(entries.length, head.length) + 1}: the trail does not end where its head says`
	);
for (const seq of blanked)
	if (!declared.some(([from, to]) => seq >= from && seq <= to))
		faults.push(`audit entry ${seq} was blanked, and no retention run says so`);

// 3. Every signed decision is the text whose hash was signed.
for (const { type, payload } of entries) {
	if (type !== 'disposition.signed' || !payload) continue;
	const { version, frozenSha256 } = JSON.parse(payload);
	const name = `decisions/version-${version}.json`;
	if (!existsSync(join(folder, name)) || sha256(read(name)) !== frozenSha256)
		faults.push(`${name} is not what was signed as version ${version}`);
}

for (const fault of faults) say(fault);
say(
	faults.length === 0
		? `Whole: ${sums.length} files, ${entries.length} audit entries`
		: `${faults.length} faults in ${sums.length} files and ${entries.length} audit entries`
);
process.exitCode = faults.length === 0 ? 0 : 1;
