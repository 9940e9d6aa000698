/** Walks every audit chain and names the first broken entry of each; ends with 1 when there is one. */
import { verifyAllChains } from '../lib/server/audit/verify';
import { closeDatabase, openDatabase } from '../lib/server/db/sequelize';
import { env } from '../lib/server/env';

openDatabase(env().databaseUrl);
const { chains, faults } = await verifyAllChains();
await closeDatabase();
for (const { chainId, seq, fault } of faults) console.log(`${chainId} entry ${seq}: ${fault}`);
console.log(`${chains} chains, ${faults.length} broken`);
process.exitCode = faults.length === 0 ? 0 : 1;
