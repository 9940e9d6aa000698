import type { Transaction } from 'sequelize';
import { secondSignatureReason, type SigningFacts } from '../../domain/authority/authority';
import type { DispositionInput } from '../../schemas/disposition';
import type { DocketView } from '../../schemas/docket';
import type { SigningStanding } from '../../schemas/signing';
import type { Context } from '../context';
import { Determination } from '../db/models/determination';
import { DispositionReview } from '../db/models/disposition-review';
import { Product } from '../db/models/product';
import { ShipmentLine } from '../db/models/shipment-line';
import { User } from '../db/models/user';
import { evidenceSha256 } from '../dispositions/freeze';
import { may } from '../policies';
import { correctionsOf } from './corrections';
import { decisionSha256 } from './decision-text';
import { getSigningRules } from './signing-rules';

type LineFacts = Omit<SigningFacts['lines'][number], 'outcome'> & { lineId: string };

async function lineFactsOf(docket: DocketView, transaction?: Transaction): Promise<LineFacts[]> {
	const rows = await ShipmentLine.findAll({ where: { shipmentId: docket.id }, transaction });
	const products = await Product.findAll({ where: { id: rows.map((row) => row.productId) }, transaction });
	return docket.lines.map((line) => {
		const productId = rows.find((row) => row.id === line.id)?.productId;
		const own = docket.assessments.filter(({ lineId, isGoverning }) => lineId === line.id && isGoverning);
		return {
			lineId: line.id,
			ordinal: line.ordinal,
			recommended: line.recommendation?.recommended ?? null,
			grades: (line.recommendation?.reasons ?? []).map(({ grade }) => grade),
			isOverStop: (line.recommendation?.reasons ?? []).some(({ code }) => code === 'stop-reached'),
			dockMayAccept: products.find(({ id }) => id === productId)?.dockMayAccept ?? false,
			valueMinor: line.valueMinor,
			currency: line.currency,
			severities: own.flatMap(({ excursions }) => excursions.map(({ severity }) => severity))
		};
	});
}

/** What the authority table looks at, apart from the decision itself; also what the signing page shows of it. */
export async function signingStanding(
	ctx: Context,
	docket: DocketView,
	transaction?: Transaction
): Promise<SigningStanding & { lineFacts: LineFacts[] }> {
	const scope = { where: { shipmentId: docket.id }, order: ['signedAt'], transaction };
	const [user, corrections, lineFacts, rules, reviews, determinations] = await Promise.all([
		User.findByPk(ctx.actor.id, { transaction }),
		correctionsOf(docket.id, transaction),
		lineFactsOf(docket, transaction),
		getSigningRules(),
		DispositionReview.findAll(scope),
		Determination.findAll(scope)
	]);
	const seen = evidenceSha256(docket);
	return {
		corrections,
		lineFacts,
		rules,
		secondSignature: secondSignatureReason(lineFacts, rules),
		isOverStop: lineFacts.some((line) => line.isOverStop),
		isQualifiedPerson: user?.isQualifiedPerson ?? false,
		reviews: reviews.map((row) => ({
			id: row.id,
			by: row.signedName,
			byId: row.signedBy,
			title: row.signedTitle,
			at: row.signedAt.toISOString(),
			zone: row.zone,
			reasons: row.reasons,
			decisionSha256: row.decisionSha256,
			decision: row.decision,
			isOfThis: row.evidenceSha256 === seen
		})),
		determinations: determinations.map((row) => ({
			id: row.id,
			text: row.text,
			by: row.signedName,
			title: row.signedTitle,
			at: row.signedAt.toISOString(),
			zone: row.zone,
			isOfThis: row.evidenceSha256 === seen
		}))
	};
}

/** The facts of one decision by one signer. */
export function signingFacts(
	{ actor }: Context,
	standing: Awaited<ReturnType<typeof signingStanding>>,
	lines: DispositionInput['lines']
): SigningFacts {
	const decided = decisionSha256(lines);
	return {
		signer: {
			id: actor.id,
			mayDecide: may(actor, 'disposition.sign'),
			mayAcceptAtDock: may(actor, 'disposition.accept-at-dock')
		},
		lines: standing.lineFacts.flatMap(({ lineId, ...line }) =>
			lines
				.filter((row) => row.lineId === lineId)
				// The value is the line's: counted once, however many groups it has.
				.map(({ outcome }, index) => ({ ...line, outcome, valueMinor: index === 0 ? line.valueMinor : null }))
		),
		corrections: standing.corrections,
		rules: standing.rules,
		reviewerIds: standing.reviews
			.filter((review) => review.isOfThis && review.decisionSha256 === decided)
			.map(({ byId }) => byId),
		hasDetermination: standing.determinations.some(({ isOfThis }) => isOfThis)
	};
}
