import type { FrozenDocket } from '../../schemas/docket';
import type { Disposition } from '../db/models/disposition';
import { sha256Hex } from '../storage/sha256';

/** The record a signature froze. Its text is hashed as stored, and parsed only after the hash agreed. */
export function frozenDocketOf(disposition: Disposition): FrozenDocket {
	if (sha256Hex(disposition.frozen) !== disposition.frozenSha256)
		throw new Error(`The frozen record of disposition ${disposition.id} does not match its hash.`);
	return JSON.parse(disposition.frozen) as FrozenDocket;
}
