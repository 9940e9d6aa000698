import { z } from 'zod';
import { emailField, glnField, neededText, optionalText, revisionField, ticked } from './field';
import { choice, listQuery } from './list';

export const partnerDuties = ['supplier', 'carrier', 'store', 'customer'] as const;
export type PartnerDuty = (typeof partnerDuties)[number];

export const partnerForm = z
	.object({
		name: neededText(120, 'Enter the firm’s name.'),
		isSupplier: ticked,
		isCarrier: ticked,
		isStore: ticked,
		isCustomer: ticked,
		gln: glnField,
		address: optionalText(300),
		countryCode: z
			.string()
			.trim()
			.toUpperCase()
			.default('')
			.refine((code) => code === '' || /^[A-Z]{2}$/.test(code), 'Two letters, such as NL or US.')
			.transform((code) => code || null),
		note: optionalText(2000),
		revision: revisionField
	})
	.refine((form) => form.isSupplier || form.isCarrier || form.isStore || form.isCustomer, {
		path: ['isSupplier'],
		message: 'Tick at least one: what is this firm to you?'
	});
export type PartnerForm = z.output<typeof partnerForm>;

export const contactForm = z.object({
	contactId: z.union([z.literal(''), z.uuid()]).default(''),
	name: neededText(120, 'Enter the person’s name.'),
	email: emailField,
	phone: optionalText(40),
	duty: neededText(80, 'Enter what they do, such as quality or claims.'),
	isNotified: ticked,
	revision: revisionField
});
export type ContactForm = z.output<typeof contactForm>;

export const contactRef = z.object({ contactId: z.uuid('There is no such contact.') });

export const partnerQuery = listQuery(['name', 'country', 'since']).extend({
	duty: choice(['any', ...partnerDuties]),
	state: choice(['in-use', 'off', 'all'])
});
export type PartnerQuery = z.output<typeof partnerQuery>;
