import { msPerHour, msPerMinute } from '../../../domain/units';
import { changeClaim } from '../../claims/change-claim';
import { openClaim } from '../../claims/open-claim';
import { Claim } from '../../db/models/claim';
import { Contact } from '../../db/models/contact';
import { Notice } from '../../db/models/notice';
import { ShipmentLine } from '../../db/models/shipment-line';
import { answerNotice } from '../../notices/answer-notice';
import { sites } from '../cast/sites';
import type { Aftermath } from '../loads/load';
import { inOffice } from '../loads/when';
import { settleNotice } from './settle-notice';
import type { Staged } from './staged';
import { contextOf, known, linkContext, type Step, type World } from './world';

/** A docket that has been opened. */
export interface Opened {
	id: string;
	number: string;
}

/** Notices younger than this without an answer are left to the worker, which mails them. */
const leftToWorkerHours = 96;

async function answer(docket: Opened, said: NonNullable<Aftermath['answer']>, atMs: number): Promise<void> {
	const notice = await Notice.findOne({ where: { shipmentId: docket.id }, rejectOnEmpty: true });
	const contact = await Contact.findByPk(notice.contactId ?? '', { rejectOnEmpty: true });
	const isDispute = said.kind === 'dispute';
	await answerNotice(linkContext(contact, docket.id, atMs), docket.id, notice.id, {
		kind: said.kind,
		disputed: isDispute ? ['opening'] : [],
		whatIsWrong: isDispute ? said.text : '',
		whatWillBeDone: isDispute ? '' : said.text,
		who: contact.name,
		doneByOn: null
	});
}

function claimSteps(world: World, staged: Staged, docket: () => Opened, decidedMs: number): Step[] {
	const plan = staged.plan.aftermath?.claim;
	if (!plan) return [];
	const { currency } = sites[staged.lane.site];
	const fields = { againstId: known(world.partnerIds, plan.against), currency, basis: plan.basis };
	let claimId = '';
	let amount = { amount: '', amountMinor: 0 };
	const open = async (atMs: number) => {
		const lines = await ShipmentLine.findAll({ where: { shipmentId: docket().id } });
		const refused = lines.filter((_, at) => (staged.plan.decided?.outcomes?.[at] ?? 'reject') === 'reject');
		const value = refused.reduce((sum, line) => sum + Number(line.valueMinor ?? 0), 0);
		const amountMinor = Math.round(value * plan.fraction);
		amount = { amount: (amountMinor / 100).toFixed(2), amountMinor };
		const ctx = contextOf(world, 'claims', atMs);
		claimId = (await openClaim(ctx, { docket: docket().number, ...fields, ...amount })).id;
	};
	const office = (ms: number) => inOffice(ms, staged.zone, world.anchor);
	const openedMs = office(decidedMs + plan.afterHours * msPerHour);
	return [
		{ atMs: openedMs, act: () => open(openedMs) },
		...(plan.then ?? []).map(({ status, afterHours }) => {
			const atMs = office(openedMs + afterHours * msPerHour);
			const act = async () => {
				const { version } = await Claim.findByPk(claimId, { rejectOnEmpty: true });
				await changeClaim(contextOf(world, 'claims', atMs), claimId, {
					...fields,
					...amount,
					status,
					version
				});
			};
			return { atMs, act };
		})
	];
}

/** What follows from a decision: the notice sent, the supplier's answer, the claim. */
export function aftermathSteps(
	world: World,
	staged: Staged,
	docket: () => Opened,
	decidedMs: number
): Step[] {
	const { decided, aftermath } = staged.plan;
	const said = aftermath?.answer;
	const steps = claimSteps(world, staged, docket, decidedMs);
	if (!decided?.notify) return steps;
	const sentMs = decidedMs + 2 * msPerMinute;
	if (said || sentMs < world.anchor.getTime() - leftToWorkerHours * msPerHour)
		steps.push({ atMs: sentMs, act: () => settleNotice(docket().id, sentMs) });
	if (said) {
		const atMs = inOffice(decidedMs + said.afterHours * msPerHour, staged.zone, world.anchor);
		steps.push({ atMs, act: () => answer(docket(), said, atMs) });
	}
	return steps;
}
