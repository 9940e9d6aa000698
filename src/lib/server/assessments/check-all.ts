import { join } from 'node:path';
import { Worker } from 'node:worker_threads';
import { QueryTypes, type Sequelize } from 'sequelize';
import { engineVersion } from '../../domain/receiving/engine-version';
import { connect } from '../db/sequelize';
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

/** Recomputes every stored assessment in batches over so many threads; 0: in this one. */
export async function checkAllAssessments(databaseUrl: string, threads: number): Promise<CheckReport> {
	const database = connect(databaseUrl, 1);
	const hands = Array.from({ length: threads }, () => hand(databaseUrl));
	const here = new BatchChecker(database);
	try {
		const batches = await batchesOf(database);
		const checks: CheckIds[] = threads === 0 ? [(ids) => here.check(ids)] : hands.map(({ check }) => check);
		return reportOf((await Promise.all(checks.map((check) => drain(batches, check)))).flat());
	} finally {
		await Promise.all(hands.map(({ stop }) => stop()));
		await database.close();
	}
}

async function batchesOf(database: Sequelize): Promise<string[][]> {
	const rows = await database.query<{ id: string }>('SELECT id FROM assessments ORDER BY id', {
		type: QueryTypes.SELECT
	});
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

/** A thread with a connection of its own that answers batch for batch. */
function hand(databaseUrl: string): { check: CheckIds; stop: () => Promise<unknown> } {
	const worker = new Worker(join(process.cwd(), 'build/node/check-worker.js'), { workerData: databaseUrl });
	const check: CheckIds = (ids) =>
		new Promise((resolve, reject) => {
			worker.once('error', reject);
			worker.once('message', (checked: CheckedAssessment[]) => {
				worker.off('error', reject);
				resolve(checked);
			});
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
