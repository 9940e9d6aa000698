import { v7 as uuid } from 'uuid';
import type { DeterminationForm } from '../../schemas/signing';
import { checkSigningComponents } from '../accounts/check-signing-components';
import type { Context } from '../context';
import { Determination } from '../db/models/determination';
import { inTransaction } from '../db/transaction';
import { evidenceSha256 } from '../dispositions/freeze';
import { docketView } from '../dockets/get-docket';
import { Refusal } from '../refusals';
import { lockDocket } from '../shipments/lock-docket';

/**
 * Signs what a qualified person has determined of goods over a stop. It speaks of the evidence as it stands: a later
 * change of the docket needs another.
 * @throws Refusal `not-allowed`, `wrong-password`, `wrong-code`, `code-needed`, `locked`, `changed-meanwhile`, `not-arrived`
 */
export async function writeDetermination(
	ctx: Context,
	number: string,
	form: DeterminationForm
): Promise<void> {
	const signer = await checkSigningComponents(ctx, form);
	const id = uuid();
	await inTransaction(ctx, async ({ transaction, record }) => {
		const shipment = await lockDocket(ctx, 'determination.write', number, transaction);
		if (!signer.isQualifiedPerson)
			throw new Refusal(
				'not-allowed',
				'Only somebody the house names a qualified person writes a determination.'
			);
		if (!shipment.arrivedAt) throw new Refusal('not-arrived');
		const docket = await docketView(shipment, ctx.now, transaction);
		if (evidenceSha256(docket) !== form.evidenceSha256) throw new Refusal('changed-meanwhile');
		await Determination.create(
			{
				id,
				shipmentId: shipment.id,
				evidenceSha256: form.evidenceSha256,
				text: form.text,
				signedBy: signer.id,
				signedName: signer.name,
				signedTitle: signer.title,
				signedAt: ctx.now,
				zone: docket.site.zone
			},
			{ transaction }
		);
		record(
			'determination.written',
			{ scope: 'shipment', id: shipment.id },
			{ determinationId: id, evidenceSha256: form.evidenceSha256, text: form.text }
		);
	});
}
