import type { ReportInput } from './report-input';

/** What a media type may be made of; anything else is told as bytes. Source: RFC 6838, 4.2. */
const mediaType = /^[a-z0-9][\w!#$&^.+-]*\/[a-z0-9][\w!#$&^.+-]*$/iu;
/** Never a path, never a control: a reader's program writes the file under this name. */
const unfitForNames = /[\p{Cc}\p{Cf}/\\:*?"<>|]/gu;

/** The raw exports as files inside the PDF, byte for byte, each under a name of its own. */
export function embeddedFiles(input: ReportInput) {
	const at = new Date(input.creationAt);
	const taken = new Set<string>();
	return Object.fromEntries(
		input.attachments.map((attachment, i) => {
			const name = freeName(attachment.name.replace(unfitForNames, '_') || 'export', taken);
			const type = mediaType.test(attachment.mediaType) ? attachment.mediaType : 'application/octet-stream';
			const src = `data:${type};base64,${Buffer.from(attachment.bytes).toString('base64')}`;
			const { description } = attachment;
			const file = {
				src,
				name,
				type,
				description,
				creationDate: at,
				modifiedDate: at,
				relationship: 'Source'
			};
			return [`file${i}`, file];
		})
	);
}

/** The second of a name gets a number before its ending. */
function freeName(name: string, taken: Set<string>): string {
	const dot = name.lastIndexOf('.');
	const [stem, ending] = dot > 0 ? [name.slice(0, dot), name.slice(dot)] : [name, ''];
	let free = name;
	for (let i = 2; taken.has(free); i++) free = `${stem} (${i})${ending}`;
	taken.add(free);
	return free;
}
