import { v7 as uuid } from 'uuid';
import type { DocketView, FrozenSignature, SeriesView } from '../../schemas/docket';
import type { DispositionInput } from '../../schemas/disposition';
import { checkSigningComponents } from '../accounts/check-signing-components';
import type { Context } from '../context';
import { Clock } from '../db/models/clock';
import { Disposition } from '../db/models/disposition';
import { Shipment } from '../db/models/shipment';
import { inTransaction, type Writing } from '../db/transaction';
import { docketView } from '../dockets/get-docket';
import { verdictOf } from '../dockets/stage';
import { queueNotice } from '../notices/queue-notice';
import { needText } from '../../messages/en/signing-needs';
import { authorizeShipment, may } from '../policies';
import { Refusal } from '../refusals';
import { frozenSeries } from './frozen-series';
import { signingNeeds } from '../../domain/authority/authority';
import { dockAcceptNeeds } from '../authority/dock-accept';
import { signingFacts, signingStanding } from '../authority/signing-standing';
import { checkDecision, refuseNeeds } from './check-decision';
import { decideGroups, type DecidedLine } from './decide-groups';
import { keepGroups, renewHold } from './keep-groups';
import { freeze, signedBefore, type SignedBefore } from './freeze';
import { keepReview } from './keep-review';

/** QA signs as QA; somebody of the dock alone signs by what the authority table leaves to the dock. */
function signingAct({ actor }: Context): 'disposition.sign' | 'disposition.accept-at-dock' {
	return may(actor, 'disposition.sign') ? 'disposition.sign' : 'disposition.accept-at-dock';
}

/** Before any password is asked: a load that is not the dock's to accept is refused to it whatever it says. */
async function refuseDock(ctx: Context, shipment: Shipment): Promise<void> {
	if (may(ctx.actor, 'disposition.sign')) return;
	const needs = await dockAcceptNeeds(ctx, await docketView(shipment, ctx.now));
	if (needs.length > 0) throw new Refusal('not-allowed', needs.map(needText).join(' '));
}

/** Locks the docket first, then reads it: what is read after the lock is what the signature falls on. */
async function lockDocket(
	ctx: Context,
	number: string,
	{ transaction }: Writing
): Promise<{ shipment: Shipment; docket: DocketView }> {
	const shipment = await Shipment.findOne({ where: { number }, transaction, lock: transaction.LOCK.UPDATE });
	authorizeShipment(ctx, signingAct(ctx), shipment);
	const row = shipment as Shipment;
	return { shipment: row, docket: await docketView(row, ctx.now, transaction) };
}

interface Decided {
	docket: DocketView;
	decided: DecidedLine[];
	series: SeriesView[];
	input: DispositionInput;
	signature: FrozenSignature;
	before: SignedBefore;
}

async function keepDecision(w: Writing, { docket, decided, series, input, signature, before }: Decided) {
	const { transaction } = w;
	const verdict = verdictOf(input.lines.map((line) => line.outcome));
	const frozen = freeze({ docket, series, decided, verdict, signature, before });
	await Disposition.create(
		{
			id: signature.dispositionId,
			shipmentId: docket.id,
			version: signature.version,
			verdict,
			reasons: input.reasons,
			amendmentReason: input.amendmentReason,
			meaning: input.meaning,
			signedBy: signature.signedById,
			signedName: signature.signedBy,
			signedTitle: signature.signedByTitle,
			signedAt: new Date(signature.signedAt),
			zone: signature.zone,
			frozen: frozen.text,
			frozenSha256: frozen.sha256
		},
		{ transaction }
	);
	await keepGroups(w, docket, signature.dispositionId, decided);
	return { verdict, frozenSha256: frozen.sha256 };
}

/** What a signature changes on the docket itself: it is decided, and no rejection clock runs for goods taken. */
async function closeDocket(
	{ transaction }: Writing,
	ctx: Context,
	shipment: Shipment,
	verdict: Shipment['verdict']
): Promise<void> {
	await shipment.update({ decidedAt: ctx.now, verdict, version: shipment.version + 1 }, { transaction });
	if (verdict === 'accepted' || verdict === 'conditions')
		await Clock.update(
			{ metAt: ctx.now, metBy: 'nothing was refused' },
			{ where: { shipmentId: shipment.id, claimId: null, metAt: null }, transaction }
		);
}

/** Where nothing is decided yet the docket stays open: the hold says what is awaited, and nothing is frozen. */
async function holdAll(
	w: Writing,
	ctx: Context,
	shipmentId: string,
	decided: readonly DecidedLine[],
	holdId: string
): Promise<{ version: null }> {
	await renewHold(w, ctx, shipmentId, decided, holdId);
	return { version: null };
}

function groupsRecorded(decided: readonly DecidedLine[]) {
	return decided.flatMap(({ line, groups }) =>
		groups.map(({ outcome, cases, pallets, name, whereabouts }) => ({
			...{ lineId: line.id, outcome, cases, pallets },
			...(name ? { name } : {}),
			whereabouts
		}))
	);
}

/**
 * Signs what becomes of a load, or, with the meaning review, that the decision was checked and another approves it. It
 * freezes the docket with its figures, and writes report and notice as jobs, all in one transaction. Held groups open a
 * hold with what is awaited; where all is held, that hold is all there is, and nothing is frozen. A later signature is a new version with a reason; the old one stays.
 * @throws Refusal `not-found`, `not-allowed`, `wrong-password`, `wrong-code`, `code-needed`, `locked`, `not-arrived`, `already-signed`,
 * `changed-meanwhile`, `invalid`
 */
export async function signDisposition(
	ctx: Context,
	number: string,
	input: DispositionInput
): Promise<{ version: number | null }> {
	const seen = await Shipment.findOne({ where: { number } });
	authorizeShipment(ctx, signingAct(ctx), seen);
	await refuseDock(ctx, seen);
	const signer = await checkSigningComponents(ctx, input);
	const [dispositionId, reviewId, holdId] = [uuid(), uuid(), uuid()];
	const series = await frozenSeries(seen.id);
	return inTransaction(ctx, async (w) => {
		const { shipment, docket } = await lockDocket(ctx, number, w);
		checkDecision(docket, input);
		const decided = decideGroups(docket, input.lines, ctx.now);
		const standing = await signingStanding(ctx, docket, w.transaction);
		if (input.meaning === 'review') return keepReview(w, ctx, { docket, input, signer, reviewId });
		refuseNeeds(signingNeeds(signingFacts(ctx, standing, input.lines)));
		if (!input.amendmentReason && input.lines.every(({ outcome }) => outcome === 'hold'))
			return holdAll(w, ctx, shipment.id, decided, holdId);
		const before = signedBefore(standing, input.lines);
		const signature: FrozenSignature = {
			dispositionId,
			version: docket.signatures.length + 1,
			signedById: signer.id,
			signedBy: signer.name,
			signedByTitle: signer.title,
			meaning: input.meaning,
			signedAt: ctx.now.toISOString(),
			zone: docket.site.zone,
			reasons: input.reasons,
			amendmentReason: input.amendmentReason
		};
		const { verdict, frozenSha256 } = await keepDecision(w, {
			docket,
			decided,
			series,
			input,
			signature,
			before
		});
		await closeDocket(w, ctx, shipment, verdict);
		await renewHold(w, ctx, shipment.id, decided, holdId);
		w.record(
			'disposition.signed',
			{ scope: 'shipment', id: shipment.id },
			{
				dispositionId,
				version: signature.version,
				verdict,
				meaning: input.meaning,
				frozenSha256,
				outcomes: groupsRecorded(decided),
				amendmentReason: input.amendmentReason
			}
		);
		w.enqueue('report', { dispositionId }, `report ${dispositionId}`);
		// Whoever was told of an earlier version hears of the new one.
		if (input.notify || docket.notices.length > 0) await queueNotice(w, ctx, shipment, dispositionId);
		return { version: signature.version };
	});
}
