import { inflateRawSync } from 'node:zlib';
import type { Connection } from 'mariadb';
import type { Spec } from '../../domain/shelf-life/spec';
import { unpackTrace } from '../../domain/trace/pack';
import { SharedRoom } from '../../domain/trace/room';
import { parseSpecFigures } from '../specs/stored-spec';
import { checkStored, type CheckedAssessment } from './check-stored';

interface BatchRow {
	id: string;
	engineVersion: string;
	inputsSha256: string;
	figures: string;
	specVersionId: string;
	specSha256: string;
	traceSha256: string;
	packed: Buffer;
}

/** Checks batches of stored assessments one after the other, with one memory and each spec parsed once. */
export class BatchChecker {
	readonly #database: Connection;
	readonly #room = new SharedRoom();
	readonly #specs = new Map<string, Spec>();

	constructor(database: Connection) {
		this.#database = database;
	}

	async check(ids: readonly string[]): Promise<CheckedAssessment[]> {
		const rows = await this.#rows(ids);
		const checked: CheckedAssessment[] = [];
		for (const { packed, specVersionId, ...row } of rows) {
			const spec = await this.#spec(specVersionId);
			const trace = unpackTrace(packed, { room: this.#room, inflate });
			checked.push(checkStored({ ...row, trace, spec }, this.#room));
		}
		return checked;
	}

	async #rows(ids: readonly string[]): Promise<BatchRow[]> {
		return this.#database.query<BatchRow[]>(
			`SELECT a.id, a.engine_version AS engineVersion, a.inputs_sha256 AS inputsSha256, a.figures,
				a.spec_version_id AS specVersionId, s.figures_sha256 AS specSha256,
				t.content_sha256 AS traceSha256, t.packed
			FROM assessments a JOIN traces t ON t.id = a.trace_id JOIN spec_versions s ON s.id = a.spec_version_id
			WHERE a.id IN (?)`,
			[ids]
		);
	}

	async #spec(id: string): Promise<Spec> {
		const known = this.#specs.get(id);
		if (known) return known;
		const [row] = await this.#database.query<{ figures: string }[]>(
			'SELECT figures FROM spec_versions WHERE id = ?',
			[id]
		);
		if (!row) throw new Error(`The spec version ${id} of an assessment is missing.`);
		const spec = parseSpecFigures(row.figures);
		this.#specs.set(id, spec);
		return spec;
	}
}

/** The server's own inflater, three times as fast as the one that also runs in a browser. */
function inflate(packed: Uint8Array, bytes: number): Uint8Array {
	return inflateRawSync(packed, { maxOutputLength: bytes });
}
