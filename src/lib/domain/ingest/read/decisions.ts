import type { Decision, DecisionField, ReadContext } from '../ingestion';
import { noOffset } from '../times/stamp';
import { nameOf } from './all-channels';
import type { Readable } from './readable';

const isStandard = ({ kind }: Readable['table']): boolean => kind === 'senml' || kind === 'epcis';

function writing({ table, encoding }: Readable, decimalComma: boolean): Decision[] {
	const made: Decision[] = [
		{
			field: 'layout',
			value: table.kind,
			because: isStandard(table) ? 'standard' : 'found',
			detail: null
		},
		{ field: 'encoding', value: encoding, because: 'found', detail: null }
	];
	if (table.delimiter !== null)
		made.push({ field: 'delimiter', value: table.delimiter, because: 'found', detail: null });
	if (decimalComma) made.push({ field: 'decimal', value: ',', because: 'found', detail: null });
	return made;
}

function zone({ axis, timing, gathered }: Readable): Decision {
	const { zone: value, by } = axis.zone;
	const isOffset = gathered.count > 0 && gathered.times.offsetMinutes[0] !== noOffset;
	const because = by !== 'file' ? by : timing.kind === 'epoch' ? 'epoch' : isOffset ? 'offset' : 'zone-named';
	return { field: 'zone', value, because, detail: null };
}

function unit({ unit: value, column, values, stated, table }: Readable, isAnswered: boolean): Decision {
	const because = isAnswered
		? 'answer'
		: isStandard(table)
			? 'standard'
			: values.unit === value
				? 'beside-values'
				: column.unit === value
					? 'head'
					: stated.unit === value
						? 'preamble'
						: 'found';
	return { field: 'unit', value, because, detail: null };
}

function column({ column: chosen, picked }: Readable): Decision {
	const because = picked.isAnswered
		? 'answer'
		: chosen.meaning.statistic === 'mean'
			? 'mean'
			: picked.twins.length > 0
				? 'twin'
				: 'only-one';
	return { field: 'column', value: nameOf(chosen), because, detail: picked.twins[0]?.name ?? null };
}

function running({ timing, stated, declared }: Readable, answers: Answered): Decision[] {
	if (!['elapsed', 'counted', 'none', 'time-of-day', 'day-and-clock'].includes(timing.kind)) return [];
	const made: Decision[] = [];
	if (declared.startMs !== null) {
		const because = answers.startMs === undefined ? 'preamble' : 'answer';
		made.push({ field: 'start', value: new Date(declared.startMs).toISOString(), because, detail: null });
	}
	const seconds = answers.intervalSeconds ?? (stated.intervalMinutes ?? 0) * 60;
	if ((timing.kind === 'none' || timing.kind === 'counted') && seconds > 0) {
		const because = answers.intervalSeconds === undefined ? 'preamble' : 'answer';
		made.push({ field: 'intervalSeconds', value: String(seconds), because, detail: null });
	}
	return made;
}

type Answered = ReadContext['answers'];

/** Answers that nothing was asked about: the file settles it, or has nothing of the kind. */
export function unusedAnswers(decisions: readonly Decision[], { answers }: ReadContext): DecisionField[] {
	const given: readonly (readonly [DecisionField, unknown])[] = [
		['dateOrder', answers.dateOrder],
		['zone', answers.zone],
		['unit', answers.unit],
		['column', answers.temperatureColumn],
		['start', answers.startMs],
		['intervalSeconds', answers.intervalSeconds],
		['part', answers.part]
	];
	const isUsed = (field: DecisionField): boolean =>
		decisions.some((decision) => decision.field === field && decision.because === 'answer');
	return given.flatMap(([field, answer]) => (answer === undefined || isUsed(field) ? [] : [field]));
}

/** Everything that was decided about a file, with what decided it. */
export function decisionsOf(readable: Readable, decimalComma: boolean, { answers }: ReadContext): Decision[] {
	const { axis, table } = readable;
	const made = [...writing(readable, decimalComma), ...(table.decisions ?? [])];
	if (axis.order !== null && axis.orderBy !== null && !isStandard(table))
		made.push({ field: 'dateOrder', value: axis.order, because: axis.orderBy, detail: null });
	made.push(zone(readable), column(readable));
	made.push(unit(readable, answers.unit !== undefined), ...running(readable, answers));
	return [...made, ...(axis.decisions ?? [])];
}
