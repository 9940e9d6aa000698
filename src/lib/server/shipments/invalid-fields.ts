import { Refusal } from '../refusals';

/** Input whose fault only the records show: no such product, a time that does not exist. Field path → sentence. */
export class InvalidFields extends Refusal {
	constructor(readonly issues: Record<string, string>) {
		super(
			'invalid',
			Object.entries(issues)
				.map(([field, fault]) => `${field}: ${fault}`)
				.join('; ')
		);
		this.name = 'InvalidFields';
	}
}

/** Refuses when anything was found wrong. */
export function refuseFaults(issues: Record<string, string>): void {
	if (Object.keys(issues).length > 0) throw new InvalidFields(issues);
}
