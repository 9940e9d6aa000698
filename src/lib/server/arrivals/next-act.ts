import type { BoardRow, NextAct } from '../../schemas/board';
import type { Stage } from '../../schemas/docket';
import type { Actor } from '../context';
import { may } from '../policies';

type Reads = BoardRow['reads'];

function actOf(stage: Stage, { due, kept, questions }: Reads, actor: Actor): NextAct['act'] {
	if (stage === 'done') return 'open';
	if (stage === 'expected') return may(actor, 'arrival.log') ? 'log-arrival' : 'open';
	if (questions > 0 && may(actor, 'read.upload')) return 'answer';
	const isRead = kept >= due && kept > 0;
	const maySign = may(actor, 'disposition.sign');
	// No trace is normal: a load without loggers waits for QA, not for a read.
	const awaitsRead = !isRead && !(due === 0 && maySign);
	if (awaitsRead && may(actor, 'read.upload') && stage === 'at-the-door') return 'upload';
	if (!maySign) return 'open';
	return isRead ? 'sign' : 'review';
}

/** The address of the act; a single open question is gone to at once. */
function hrefOf(number: string, act: NextAct['act'], questionIds: readonly string[]): string {
	const docket = `/shipments/${number}`;
	if (act === 'log-arrival') return `${docket}/arrival`;
	if (act === 'upload') return `${docket}/reads`;
	if (act === 'answer')
		return questionIds.length === 1 ? `${docket}/reads/${questionIds[0]}` : `${docket}/reads`;
	return act === 'sign' ? `${docket}/sign` : docket;
}

/** What this person does next with a load, and whether it waits for somebody in their role. */
export function nextAct(
	actor: Actor,
	load: { number: string; stage: Stage; reads: Reads; questionIds: readonly string[]; isAskedOfQa: boolean }
): NextAct {
	const { stage, reads } = load;
	const act = actOf(stage, reads, actor);
	const isQa = may(actor, 'disposition.sign');
	const isForQa =
		stage === 'on-hold' || act === 'sign' || act === 'review' || (act === 'answer' && load.isAskedOfQa);
	const isForDock = stage === 'at-the-door' && (act === 'upload' || act === 'answer');
	const isMine = isQa ? isForQa : may(actor, 'arrival.log') && isForDock;
	return { act, href: hrefOf(load.number, act, load.questionIds), questions: reads.questions, isMine };
}
