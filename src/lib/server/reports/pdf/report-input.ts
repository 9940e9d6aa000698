import type { FrozenDocket } from '../../../schemas/docket';

/** Who signed the version this report prints, and what the signature means. */
export interface ReportSignature {
	readonly signedBy: string;
	readonly signedByTitle: string;
	readonly meaning: 'approval' | 'review' | 'authorship';
	/** ISO 8601, UTC. */
	readonly signedAt: string;
	/** IANA zone in which the signer saw the time. */
	readonly zone: string;
	readonly version: number;
	readonly reasons: string;
	readonly frozenSha256: string;
	readonly amendmentReason: string | null;
}

/** A raw export, embedded as it was uploaded. */
export interface ReportAttachment {
	readonly name: string;
	readonly bytes: Uint8Array;
	readonly mediaType: string;
	readonly description: string;
	/** As received, or derived from what was. Source: ISO 32000-2, 7.11.3, AFRelationship. */
	readonly relationship: 'Source' | 'Data';
}

/** A photograph with the bytes it is kept as. */
export interface ReportPhoto {
	readonly id: string;
	readonly sha256: string;
	readonly jpeg: Uint8Array;
}

/** Everything the report is drawn from; the same input gives the same bytes. Structured-cloneable. */
export interface ReportInput {
	readonly frozen: FrozenDocket;
	readonly signature: ReportSignature;
	/** Ready sentences of the recommendation by line id. */
	readonly reasonTexts: Readonly<Record<string, readonly string[]>>;
	/** Where anyone may ask whether this report is genuine and current; printed and in the check code. */
	readonly verifyAddress: string;
	readonly attachments: readonly ReportAttachment[];
	/** Those that are light enough to print; every one is named in the record. */
	readonly photos: readonly ReportPhoto[];
	readonly organisation: string;
	readonly pageSize: 'a4' | 'letter';
	/** ISO 8601; stands as the file's creation date, so that the bytes do not depend on the hour of printing. */
	readonly creationAt: string;
}
