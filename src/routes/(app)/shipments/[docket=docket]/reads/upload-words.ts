import type { MarkKind } from '$lib/components/ui/mark';
import type { TemperatureUnit } from '$lib/domain/units';
import { count, counted, lifeDays, range, temperature, temperatureSign } from '$lib/format';
import { questionText, refusalText, oddityText } from '$lib/messages/en/ingest';
import type { LifeHere } from './assess-here';
import type { Glance } from './file-glance';
import { everyWords, quantityWords, readStateWords, spanWords } from './read-words';
import type { UploadItem } from './upload-queue.svelte';

/** How the reader of the page reads times and temperatures. */
export interface Eyes {
	zone: string;
	unit: TemperatureUnit;
}

/** Where a file stands, as a mark and a word. */
export function standingOf({ step, read }: Pick<UploadItem, 'step' | 'read'>): {
	mark: MarkKind;
	word: string;
} {
	if (step === 'sent' && read) return readStateWords[read.state];
	if (step === 'failed') return { mark: 'reject', word: 'Not taken' };
	if (step === 'no-network') return { mark: 'hold', word: 'Waits for the network' };
	if (step === 'stopped') return { mark: 'expected', word: 'Stopped' };
	const words = { reading: 'Being read here', queued: 'To be sent', sending: 'Being sent', sent: 'Sent' };
	return { mark: step === 'sending' ? 'at-the-door' : 'expected', word: words[step] };
}

/** What this device made of a file, a line each: readings, channels, oddities; or its question; or why it is none. */
export function glanceLines(glance: Glance, { zone, unit }: Eyes): string[] {
	if (glance.kind === 'refused') return [refusalText(glance.code, glance)];
	if (glance.kind === 'question') return [`Will ask: ${questionText(glance.question).title}`];
	const { readings, firstMs, lastMs, usualIntervalMs, channels, oddities, lives } = glance;
	const degrees = (celsius: number | null) => (celsius === null ? '–' : temperature(celsius, unit, 'en'));
	const inWords = channels.map(({ name, quantity, minCelsius, maxCelsius, isAssessed, readings: all }) =>
		quantity === 'temperature'
			? `${name}${isAssessed && channels.length > 1 ? ', to be assessed' : ''}: ${degrees(minCelsius)} to ${degrees(maxCelsius)} ${temperatureSign(unit)}`
			: `${name}: ${quantityWords[quantity]}, ${count(all, 'en')} values`
	);
	return [
		`${counted(readings, 'reading')}, every ${everyWords(usualIntervalMs)}, ${spanWords(firstMs, lastMs, zone)}`,
		...lives.map(lifeWords),
		...inWords,
		...oddities.map(oddityText)
	];
}

/** Life left as this device works it out; the server says the same once the read is kept. */
function lifeWords({ serial, line, remainingHours, neededHours, excursions, hasStop }: LifeHere): string {
	const { value, low, high } = remainingHours;
	const isShort = low < neededHours;
	const need = `${isShort ? 'short of' : 'meets'} the ${lifeDays(neededHours, 'en')} d needed`;
	const found = excursions === 0 ? '' : `, ${counted(excursions, 'excursion')}`;
	const stop = hasStop ? ', a stop was passed' : '';
	const figures = `${lifeDays(value, 'en')} d (${range(lifeDays(low, 'en'), lifeDays(high, 'en'))})`;
	return `${line}, by logger ${serial}: life left ${figures}, ${need}${found}${stop}`;
}

/** What has become of all of them: "8 of 10 sent. 1 asks a question. 1 cannot be read." */
export function summaryWords(items: readonly Pick<UploadItem, 'step' | 'read'>[]): string {
	const having = (found: (item: Pick<UploadItem, 'step' | 'read'>) => boolean) => items.filter(found).length;
	const sent = having(({ step }) => step === 'sent');
	const parts: [number, string, string][] = [
		[having(({ read }) => read?.state === 'understood'), 'is read', 'are read'],
		[having(({ read }) => read?.state === 'question'), 'asks a question', 'ask a question'],
		[having(({ read }) => read?.state === 'refused'), 'cannot be read', 'cannot be read'],
		[having(({ read }) => read?.isDuplicate === true), 'was here already', 'were here already'],
		[having(({ step }) => step === 'no-network'), 'waits for the network', 'wait for the network'],
		[having(({ step }) => step === 'failed'), 'was not taken', 'were not taken'],
		[having(({ step }) => step === 'stopped'), 'was stopped', 'were stopped']
	];
	const said = parts.flatMap(([many, one, more]) => (many > 0 ? `${many} ${many === 1 ? one : more}.` : []));
	return [`${sent} of ${counted(items.length, 'file')} sent.`, ...said].join(' ');
}
