import type { Correction, Need } from '../../domain/authority/authority';

const dockWhy = {
	role: 'Your role does not decide dockets; QA does.',
	'not-accept': 'The dock signs a plain accept only. Anything else is QA’s to decide.',
	product: 'This product is not one the dock accepts by itself. QA decides.',
	'not-known': 'Nothing is recommended for this line yet, so QA decides.',
	finding: 'A finding speaks against this line, so QA decides.'
} as const;

const corrections: Record<Correction['kind'], string> = {
	trim: 'trim',
	clock: 'clock correction',
	handover: 'change of the handovers',
	papers: 'change of the papers',
	pulp: 'further pulp reading',
	read: 'withdrawal of a read'
};

/** What is still missing before somebody may sign, said to them. */
export function needText(need: Need): string {
	if (need.code === 'qa-decides') return `Line ${need.line}: ${dockWhy[need.why]}`;
	if (need.code === 'another-person')
		return `Your own ${corrections[need.kind]} changed what is recommended. Another person must review or sign.`;
	if (need.code === 'determination')
		return `Line ${need.lines.join(', ')} went over an absolute stop. The goods can be taken only on a qualified person’s written determination.`;
	return need.why === 'value'
		? 'The value of this load needs two signatures: one person signs a review, another approves.'
		: 'An excursion this grave needs two signatures: one person signs a review, another approves.';
}
