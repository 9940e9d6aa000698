import { sha256Hex } from '../../storage/sha256';
import type { ReportAttachment, ReportInput } from './report-input';

/** What a media type may be made of; anything else is told as bytes. Source: RFC 6838, 4.2. */
const mediaType = /^[a-z0-9][\w!#$&^.+-]*\/[a-z0-9][\w!#$&^.+-]*$/iu;
/** Never a path, never a control: a reader's program writes the file under this name. */
const unfitForNames = /[\p{Cc}\p{Cf}/\\:*?"<>|]/gu;

/** The raw exports as files inside the PDF, byte for byte, each under a name of its own. */
export function embeddedFiles({ attachments, creationAt }: ReportInput) {
	const at = new Date(creationAt);
	const names = namesOf(attachments);
	return Object.fromEntries(
		attachments.map(({ bytes, mediaType: told, description, relationship }, i) => {
			const type = mediaType.test(told) ? told : 'application/octet-stream';
			const src = `data:${type};base64,${Buffer.from(bytes).toString('base64')}`;
			const name = names[i] ?? `export-${i}`;
			const file = {
				src,
				name,
				type,
				description,
				creationDate: at,
				modifiedDate: at,
				relationship
			};
			return [`file${i}`, file];
		})
	);
}

/** Under which name the file of a hash lies inside; the bytes decide, not what they were called. */
export function namesByHash(attachments: readonly ReportAttachment[]): ReadonlyMap<string, string> {
	const names = namesOf(attachments);
	return new Map(attachments.map(({ bytes }, i) => [sha256Hex(bytes), names[i] ?? '']));
}

/** The second of a name gets a number before its ending. */
function namesOf(attachments: readonly ReportAttachment[]): string[] {
	const taken = new Set<string>();
	return attachments.map((attachment) => {
		const name = attachment.name.replace(unfitForNames, '_') || 'export';
		const dot = name.lastIndexOf('.');
		const [stem, ending] = dot > 0 ? [name.slice(0, dot), name.slice(dot)] : [name, ''];
		let free = name;
		for (let i = 2; taken.has(free); i++) free = `${stem} (${i})${ending}`;
		taken.add(free);
		return free;
	});
}
