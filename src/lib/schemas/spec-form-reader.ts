import type { SpecFaultCode } from '../domain/shelf-life/spec-fault';
import { celsiusFromFahrenheit, hoursPerDay } from '../domain/units';
import type { SpecFormValues } from './spec-form-values';

/** What can be wrong with a field besides what the figures say together. */
export type FormFaultCode =
	SpecFaultCode | 'missing' | 'not-a-clock' | 'row-incomplete' | 'grace-in-all-short' | 'text-too-long';

/** A fault of one field of the editor. */
export interface FormFault {
	readonly field: string;
	readonly code: FormFaultCode;
}

const longestText = 500;

/** Reads fields one by one and notes what cannot be read; a faulty figure reads as zero and is never used. */
export class FieldReader {
	readonly faults: FormFault[] = [];
	private readonly isFahrenheit: boolean;

	constructor(private readonly values: SpecFormValues) {
		this.isFahrenheit = values.unit === 'fahrenheit';
	}

	text(field: string): string {
		const text = (this.values[field] ?? '').trim();
		if (text.length > longestText) this.note(field, 'text-too-long');
		return text;
	}

	has(field: string): boolean {
		return this.text(field) !== '';
	}

	note(field: string, code: FormFaultCode): number {
		this.faults.push({ field, code });
		return 0;
	}

	number(field: string): number {
		const text = this.text(field).replace('−', '-').replace(',', '.');
		if (text === '') return this.note(field, 'missing');
		return /^[+-]?\d{1,9}(\.\d{1,9})?$/.test(text) ? Number(text) : this.note(field, 'not-a-number');
	}

	degrees(field: string): number {
		const degrees = this.number(field);
		return this.isFahrenheit ? rounded(celsiusFromFahrenheit(degrees)) : degrees;
	}

	/** A difference of temperatures: scaled, not shifted. */
	span(field: string): number {
		const degrees = this.number(field);
		return this.isFahrenheit ? rounded((degrees * 5) / 9) : degrees;
	}

	hoursOfDays(field: string): number {
		return rounded(this.number(field) * hoursPerDay);
	}

	minutesOfClock(field: string): number {
		const text = this.text(field);
		if (text === '') return this.note(field, 'missing');
		const parts = /^(\d{1,3}):([0-5]\d)$/.exec(text);
		return parts ? Number(parts[1]) * 60 + Number(parts[2]) : this.note(field, 'not-a-clock');
	}

	/** What an empty field means is null. */
	optional(field: string, read: (field: string) => number): number | null {
		return this.has(field) ? read.call(this, field) : null;
	}
}

/** Drops the binary dust of a conversion; a millionth of a degree or an hour is nothing. */
function rounded(value: number): number {
	return Number(value.toFixed(6));
}
