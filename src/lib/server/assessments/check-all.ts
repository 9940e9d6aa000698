import { join } from 'node:path';
import { Worker } from 'node:worker_threads';
import type { Connection } from 'mariadb';
import { engineVersion } from '../../domain/receiving/engine-version';
import { connectPlainly } from '../db/plain-connection';
import { BatchChecker } from './check-batch';
import type { CheckedAssessment } from './check-stored';

const batchAssessments = 50;

/** What the check found, by the engine version that made the figures; the present one first. */
export interface CheckReport {
	engineVersion: string;
	readings: number;
	versions: {
		engineVersion: string;
		isPresent: boolean;
		assessments: number;
		/** Those that could not be recomputed, or of which a digit differs. */
		differing: CheckedAssessment[];
		largestRelative: number;
	}[];
	/** Every assessment of the present version came out to the last digit. */
	isSound: boolean;
}

type CheckIds = (ids: readonly string[]) => Promise<CheckedAssessment[]>;

/** Batches that are on their way at once to each thread: the next is fetched while one is checked. */
const ahead = 2;

/** Recomputes every stored assessment in batches, in this thread and so many others. */
export async function checkAllAssessments(databaseUrl: string, others: number): Promise<CheckReport> {
	const database = await connectPlainly(databaseUrl);
	const hands = Array.from({ length: others }, () => hand(databaseUrl));
	const here = new BatchChecker(database);
	try {
		const batches = await batchesOf(database);
		const checks: CheckIds[] = [...hands.map(({ check }) => check), (ids) => here.check(ids)];
		const drains = checks.flatMap((check) => Array.from({ length: ahead }, () => drain(batches, check)));
		return reportOf((await Promise.all(drains)).flat());
	} finally {
		await Promise.all(hands.map(({ stop }) => stop()));
		await database.end();
	}
}

async function batchesOf(database: Connection): Promise<string[][]> {
	const rows = await database.query<{ id: string }[]>('SELECT id FROM assessments ORDER BY id');
	const batches: string[][] = [];
	for (let at = 0; at < rows.length; at += batchAssessments) {
		batches.push(rows.slice(at, at + batchAssessments).map(({ id }) => id));
	}
	return batches;
}

/** Takes batches off the common heap until there are none. */
async function drain(batches: string[][], check: CheckIds): Promise<CheckedAssessment[]> {
	const checked: CheckedAssessment[] = [];
	for (let ids = batches.pop(); ids !== undefined; ids = batches.pop()) checked.push(...(await check(ids)));
	return checked;
}

/** A thread with a connection of its own that answers batch for batch, in the order asked. */
function hand(databaseUrl: string): { check: CheckIds; stop: () => Promise<unknown> } {
	const worker = new Worker(join(process.cwd(), 'build/node/check-worker.js'), { workerData: databaseUrl });
	const waiting: { resolve: (checked: CheckedAssessment[]) => void; reject: (error: Error) => void }[] = [];
	worker.on('message', (checked: CheckedAssessment[]) => waiting.shift()?.resolve(checked));
	worker.on('error', (error) => waiting.splice(0).forEach(({ reject }) => reject(error)));
	const check: CheckIds = (ids) =>
		new Promise((resolve, reject) => {
			waiting.push({ resolve, reject });
			worker.postMessage(ids);
		});
	return { check, stop: () => worker.terminate() };
}

function reportOf(checked: readonly CheckedAssessment[]): CheckReport {
	const made = new Set([engineVersion, ...checked.map((one) => one.engineVersion).toSorted()]);
	const versions = [...made].map((version) => {
		const ofVersion = checked.filter((one) => one.engineVersion === version);
		return {
			engineVersion: version,
			isPresent: version === engineVersion,
			assessments: ofVersion.length,
			differing: ofVersion.filter(({ fault, differences }) => fault !== null || differences.length > 0),
			largestRelative: ofVersion.reduce((most, one) => Math.max(most, one.largestRelative), 0)
		};
	});
	return {
		engineVersion,
		readings: checked.reduce((sum, { readings }) => sum + readings, 0),
		versions,
		isSound: versions.every(({ isPresent, differing }) => !isPresent || differing.length === 0)
	};
}
