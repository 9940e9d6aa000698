import { instantOf, localText } from './local-time';
import type { Stretch } from './trim-ends';

/** A trim that somebody is thinking of: moved on the chart or typed, and nowhere kept. */
export class TrimDraft {
	stretch = $state.raw<Stretch | null>(null);
	/** Its ends as the fields have them, by the clock of the site. */
	fromText = $state('');
	toText = $state('');
	/** The fields say what the chart set: then the instants are sent to the millisecond, whatever the clocks do. */
	isExact = $state(false);
	isOpen = $state(false);
	readonly #zone: string;
	readonly #fields: { fromText: string; toText: string };

	constructor(zone: string, fields: { fromText: string; toText: string }) {
		this.#zone = zone;
		this.#fields = fields;
		this.fromText = fields.fromText;
		this.toText = fields.toText;
	}

	/** From the chart; null puts the ends back, and the fields to what they were. */
	move(stretch: Stretch | null): void {
		this.stretch = stretch;
		this.isExact = stretch !== null;
		const { fromText, toText } = stretch
			? { fromText: localText(stretch.fromMs, this.#zone), toText: localText(stretch.toMs, this.#zone) }
			: this.#fields;
		this.fromText = fromText;
		this.toText = toText;
		this.isOpen ||= stretch !== null;
	}

	/** From a field: the chart follows as soon as both ends are times, one after the other. */
	type(end: 'from' | 'to', text: string): void {
		if (text === (end === 'from' ? this.fromText : this.toText)) return;
		if (end === 'from') this.fromText = text;
		else this.toText = text;
		const [fromMs, toMs] = [instantOf(this.fromText, this.#zone), instantOf(this.toText, this.#zone)];
		this.isExact = false;
		this.stretch = fromMs !== null && toMs !== null && fromMs < toMs ? { fromMs, toMs } : null;
	}
}
