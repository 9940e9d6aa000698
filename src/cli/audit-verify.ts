/**
 * `npm run audit:verify`: walks the checkpoints and every audit chain, names the first broken entry of each, and ends
 * with 1 when there is one. `-- 12:<sha256>` holds a checkpoint that was written down elsewhere against what is there.
 */
import { chainFaultText, checkpointFaultText, unrecordedText } from '../lib/messages/en/chain-faults';
import { verifyAllChains, type Verified } from '../lib/server/audit/verify';
import { closeDatabase, openDatabase } from '../lib/server/db/sequelize';
import { env } from '../lib/server/env';

function faultLines({ faults, checkpointFault, unrecorded }: Verified): string[] {
	return [
		...(checkpointFault ? [checkpointFaultText(checkpointFault)] : []),
		...faults.map(chainFaultText),
		...unrecorded.map(unrecordedText)
	];
}

async function main(): Promise<number> {
	const [argument] = process.argv.slice(2);
	const noted = argument ? /^(\d+):([0-9a-f]{64})$/.exec(argument) : null;
	if (argument && !noted) {
		console.error('Give a checkpoint as NUMBER:SHA256, or nothing.');
		return 2;
	}
	openDatabase(env().databaseUrl);
	try {
		const verified = await verifyAllChains(noted && { seq: Number(noted[1]), sha256: noted[2] ?? '' });
		const lines = faultLines(verified);
		for (const line of lines) console.log(line);
		const { chains, lastCheckpoint } = verified;
		console.log(
			lines.length === 0 ? `${chains} chains, none broken` : `${chains} chains, ${lines.length} faults`
		);
		if (lastCheckpoint)
			console.log(`Write this down elsewhere: checkpoint ${lastCheckpoint.seq}:${lastCheckpoint.sha256}`);
		return lines.length === 0 ? 0 : 1;
	} finally {
		await closeDatabase();
	}
}

process.exitCode = await main();
