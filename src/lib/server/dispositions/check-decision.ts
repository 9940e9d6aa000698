import type { DocketView } from '../../schemas/docket';
import type { DispositionInput } from '../../schemas/disposition';
import type { Need } from '../../domain/authority/authority';
import { needText } from '../../messages/en/signing-needs';
import { Refusal } from '../refusals';
import { evidenceSha256 } from './freeze';

/** Refuses a decision the docket does not allow, before anything is written. */
export function checkDecision(docket: DocketView, input: DispositionInput): void {
	if (!docket.arrival) throw new Refusal('not-arrived');
	if (docket.signatures.length > 0 && !input.amendmentReason) throw new Refusal('already-signed');
	if (input.evidenceSha256 !== evidenceSha256(docket)) throw new Refusal('changed-meanwhile');
	const decided = new Set(input.lines.map((line) => line.lineId));
	const isComplete =
		docket.lines.every((line) => decided.has(line.id)) && decided.size === docket.lines.length;
	if (!isComplete) throw new Refusal('invalid', 'Decide every line of the docket, each once.');
	if (!input.reasons && departsFrom(docket, input))
		throw new Refusal('invalid', 'You depart from the recommendation. Say why: it is printed on the report.');
}

/** Refuses a signature while something the authority table asks for is missing, all of it said. */
export function refuseNeeds(needs: readonly Need[]): void {
	if (needs.length > 0) throw new Refusal('not-yet-yours', needs.map(needText).join(' '));
}

/** Whether some line is decided otherwise than recommended; conditions are a mild accept. */
export function departsFrom(docket: DocketView, input: Pick<DispositionInput, 'lines'>): boolean {
	return docket.lines.some((line) => {
		const recommended = line.recommendation?.recommended;
		const outcomes = input.lines.filter((row) => row.lineId === line.id).map(({ outcome }) => outcome);
		if (!recommended) return false;
		return outcomes.some((outcome) =>
			recommended === 'accept' ? outcome === 'reject' || outcome === 'hold' : outcome !== recommended
		);
	});
}
