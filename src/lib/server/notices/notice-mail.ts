import { count, duration, lifeDays, temperature, temperatureSign } from '../../format';
import { dayTime, dayOfYear, time, zoneName } from '../../format-time';
import { groupDetails } from '../../messages/en/line-groups';
import type { LineOutcomeView } from '../../schemas/docket';
import type { SupplierDocketView, SupplierExcursionView } from '../../schemas/supplier';
import { renderMail, type MailContent, type MailMark } from '../mail/layout';

/** Facts of a notice: what was signed, the notice's own number and clock, and the way in. */
export interface NoticeFacts {
	docket: Omit<SupplierDocketView, 'report' | 'notice'>;
	noticeNumber: string;
	answerByAt: string | null;
	contactName: string;
	link: string;
	hasReport: boolean;
	/** Of a new version: what it changes and why. */
	amended?: { version: number; reason: string; changes: readonly string[] } | null;
}

const locale = 'en';
const minuteMs = 60_000;

const outcomeWords: Record<string, { mark: MailMark; words: string }> = {
	accept: { mark: 'accept', words: 'accepted' },
	conditions: { mark: 'conditions', words: 'accepted with conditions' },
	hold: { mark: 'hold', words: 'held' },
	reject: { mark: 'reject', words: 'refused' }
};

type Line = NoticeFacts['docket']['lines'][number];

/** The line's groups, or the whole line as the only one. */
function groupsOf(line: Line): Pick<LineOutcomeView, 'outcome' | 'cases'>[] {
	return line.groups ?? [{ outcome: line.outcome ?? 'hold', cases: line.cases }];
}

function quantities({ lines }: NoticeFacts['docket']): string {
	const groups = lines.flatMap(groupsOf);
	const sum = (counted: typeof groups) => counted.reduce((total, group) => total + group.cases, 0);
	const total = sum(groups);
	const refused = sum(groups.filter(({ outcome }) => outcome === 'reject'));
	const held = sum(groups.filter(({ outcome }) => outcome === 'hold'));
	const waiting = held > 0 ? `, ${count(held, locale)} on hold` : '';
	if (refused === 0)
		return `${count(total - held, locale)} cases taken in${waiting}, readings outside the limits`;
	return refused === total
		? `all ${count(total, locale)} cases refused`
		: `${count(refused, locale)} of ${count(total, locale)} cases refused${waiting}`;
}

function byInstant(at: string, zone: string): string {
	return `${dayTime(at, zone, locale)} ${zoneName(at, zone)}`;
}

/** The outcome in quantities, and by when an answer is asked for. */
export function noticeSubject({
	docket,
	answerByAt,
	amended
}: Pick<NoticeFacts, 'docket' | 'answerByAt' | 'amended'>): string {
	const answer = answerByAt ? `; answer by ${dayTime(answerByAt, docket.zone, locale)}` : '';
	const kind = amended ? `Amended, version ${amended.version}: your load` : 'Your load';
	return `${kind} ${docket.number}: ${quantities(docket)}${answer}`;
}

function extremeFact(
	{ excursions, temperatureUnit }: NoticeFacts['docket'],
	kind: SupplierExcursionView['kind']
): string {
	const sign = temperatureSign(temperatureUnit);
	const own = excursions.filter((excursion) => excursion.kind === kind);
	if (own.length === 0) return 'within the limit';
	const worst = own.reduce((a, b) => ((kind === 'too-warm') === b.extremeCelsius > a.extremeCelsius ? b : a));
	const minutes = own.reduce((sum, excursion) => sum + excursion.minutes, 0);
	const degrees = (celsius: number) => `${temperature(celsius, temperatureUnit, locale)} ${sign}`;
	return `${degrees(worst.extremeCelsius)}, limit ${degrees(worst.limitCelsius)}, outside for ${duration(minutes * minuteMs)}`;
}

function lifeFact({ lines }: NoticeFacts['docket']): string {
	const known = lines.flatMap((line) =>
		line.remainingHours ? [lifeDays(line.remainingHours.value, locale)] : []
	);
	if (known.length === 0) return 'not known: no readings';
	return `${known.join(', ')} d; needed ${[...new Set(lines.map((line) => lifeDays(line.neededHours, locale)))].join(', ')} d`;
}

/** A line as one row, or a row a group: what becomes of how many cases, and with what. */
function outcomesOf(line: Line, zone: string): NonNullable<MailContent['outcomes']> {
	const { ordinal, lot, cases } = line;
	const row = (outcome: string, counted: number, detail: string, name?: string) => {
		const { mark, words } = outcomeWords[outcome] ?? { mark: 'hold' as const, words: 'held' };
		return {
			mark,
			name: `Line ${ordinal}, lot ${lot}${name ? `, ${name}` : ''}`,
			words: `${words}, ${count(counted, locale)} cases${detail ? `: ${detail}` : ''}`
		};
	};
	if (!line.groups)
		return [row(line.outcome ?? 'hold', cases, line.details ?? line.condition ?? line.reason ?? '')];
	return line.groups.map((group) => row(group.outcome, group.cases, groupDetails(group, zone), group.name));
}

/** That an earlier notice no longer holds, and in what. */
function amendmentParagraphs({ amended }: NoticeFacts): string[] {
	if (!amended) return [];
	const { version, reason, changes } = amended;
	const what = changes.length > 0 ? changes.join(' ') : 'The outcomes stay as they were.';
	return [
		`the decision on this load has been amended: version ${version} replaces the one you were told of. ${what}${reason ? ` Reason: ${reason}` : ''}`
	];
}

function contentOf(facts: NoticeFacts): MailContent {
	const { docket, noticeNumber, answerByAt, contactName, link, hasReport } = facts;
	const times = docket.excursions.length === 1 ? 'once' : `${docket.excursions.length} times`;
	const outside =
		docket.excursions.length === 0
			? 'The readings stayed within the limits.'
			: `The logger that decided was outside the limits ${times}.`;
	const refused = docket.lines.flatMap(groupsOf).some(({ outcome }) => outcome === 'reject');
	return {
		kicker: `${docket.siteName} · notice ${noticeNumber}`,
		title: refused ? 'Goods of your load were refused' : 'Excursions on your load',
		greeting: `Dear ${contactName},`,
		paragraphs: [
			...amendmentParagraphs(facts),
			...(refused
				? ['Please tell us today what becomes of the refused goods: collection, release to us, or disposal.']
				: []),
			`we received ${docket.title} on ${byInstant(docket.arrivedAt, docket.zone)}. ${outside} These are readings; they do not say whose fault it was.`
		],
		facts: [
			{
				label: 'Docket, order',
				value: [docket.number, docket.purchaseOrder].filter(Boolean).join(', '),
				isFigure: true
			},
			{
				label: 'Received',
				value: `${dayOfYear(docket.arrivedAt, docket.zone, locale)}, ${time(docket.arrivedAt, docket.zone)} ${zoneName(docket.arrivedAt, docket.zone)}`
			},
			{ label: 'Outcome', value: quantities(docket) },
			{ label: 'Highest', value: extremeFact(docket, 'too-warm'), isFigure: true },
			{ label: 'Lowest', value: extremeFact(docket, 'too-cold'), isFigure: true },
			{ label: 'Life left', value: lifeFact(docket), isFigure: true }
		],
		outcomes: docket.lines.flatMap((line) => outcomesOf(line, docket.zone)),
		button: { word: 'See the evidence and answer', href: link },
		after: [
			...(answerByAt ? [`Please answer by ${byInstant(answerByAt, docket.zone)}.`] : []),
			'The link is yours and opens this docket alone. A forwarded or used link offers to send you a fresh one.'
		],
		foot: `Sent by ${docket.siteName} because you shipped this load. ${hasReport ? 'The signed receiving report is attached. ' : ''}Life left is an estimate of quality from temperature alone. It does not assess safety.`
	};
}

/** The notice as a mail: subject, HTML and plain text with the same figures, naming no other party. */
export function noticeMail(facts: NoticeFacts): { subject: string; html: string; text: string } {
	return { subject: noticeSubject(facts), ...renderMail(contentOf(facts)) };
}
