import { z } from 'zod';
import { emailField, neededText, optionalText, revisionField, tickedOf } from './field';
import { choice, listQuery } from './list';

export const accountRoles = ['dock', 'qa', 'claims', 'admin', 'supplier'] as const;
export type AccountRole = (typeof accountRoles)[number];

/** Long rather than strange: length is what a guesser pays for. */
export const shortestPassword = 12;
const longestPassword = 200;

const newPassword = z
	.string()
	.min(
		shortestPassword,
		`At least ${shortestPassword} characters; a few words are easier to keep than signs.`
	)
	.max(longestPassword, `At most ${longestPassword} characters.`);

export const signInForm = z.object({
	email: z.string().trim().min(1, 'Enter your e-mail address.').max(254, 'That is too long for an address.'),
	password: z
		.string()
		.min(1, 'Enter your password.')
		.max(longestPassword, 'That is too long for a password.'),
	code: z.string().trim().max(12).default('')
});

export const linkRequestForm = z.object({ email: emailField });

export const invitationForm = z
	.object({
		name: neededText(120, 'Enter your name; it stands under what you sign.'),
		password: newPassword,
		passwordAgain: z.string()
	})
	.refine((form) => form.password === form.passwordAgain, {
		path: ['passwordAgain'],
		message: 'The two are not the same.'
	});

export const ownAccountForm = z.object({
	name: neededText(120, 'Enter your name; it stands under what you sign.'),
	temperatureUnit: z
		.union([z.literal(''), z.enum(['celsius', 'fahrenheit'])])
		.default('')
		.transform((unit) => unit || null)
});
export type OwnAccountForm = z.output<typeof ownAccountForm>;

export const passwordForm = z
	.object({
		oldPassword: z.string().min(1, 'Enter the password you have now.'),
		newPassword,
		newPasswordAgain: z.string()
	})
	.refine((form) => form.newPassword === form.newPasswordAgain, {
		path: ['newPasswordAgain'],
		message: 'The two are not the same.'
	});

export const themes = ['system', 'light', 'dark'] as const;
export const themeForm = z.object({ theme: z.enum(themes) });
export const siteChoiceForm = z.object({ siteId: z.uuid('Choose one of your sites.') });

/** What an admin says of somebody: a supplier's user stands for one firm, staff work at one site or more. */
const standing = {
	name: neededText(120, 'Enter the person’s name.'),
	title: optionalText(120),
	roles: tickedOf(z.enum(accountRoles)).refine((roles) => roles.length > 0, 'Tick at least one role.'),
	siteIds: tickedOf(z.uuid('Choose sites from the list.')),
	partnerId: z
		.union([z.literal(''), z.uuid('Choose a firm from the list.')])
		.default('')
		.transform((id) => id || null),
	/** May determine, in writing, what an absolute stop means for the goods. */
	isQualifiedPerson: z
		.string()
		.optional()
		.transform((value) => value === 'on' || value === 'true'),
	revision: revisionField
};

interface Standing {
	roles: AccountRole[];
	siteIds: string[];
	partnerId: string | null;
}

function checkStanding({ roles, siteIds, partnerId }: Standing, context: z.RefinementCtx): void {
	const isSupplier = roles.includes('supplier');
	const say = (path: string, message: string) => context.addIssue({ code: 'custom', path: [path], message });
	if (isSupplier && roles.length > 1) say('roles', 'A supplier’s user has no other role.');
	if (isSupplier && !partnerId) say('partnerId', 'Choose the firm whose loads this person sees.');
	if (!isSupplier && partnerId) say('partnerId', 'Only a supplier’s user belongs to a firm. Choose none.');
	if (!isSupplier && siteIds.length === 0) say('siteIds', 'Tick at least one site.');
	if (isSupplier && siteIds.length > 0) say('siteIds', 'A supplier’s user works at no site of yours.');
}

export const inviteForm = z.object({ email: emailField, ...standing }).superRefine(checkStanding);
export type InviteForm = z.output<typeof inviteForm>;

export const accountForm = z.object(standing).superRefine(checkStanding);
export type AccountForm = z.output<typeof accountForm>;

export const accountQuery = listQuery(['name', 'email', 'seen']).extend({
	role: choice(['any', ...accountRoles]),
	state: choice(['in-use', 'invited', 'locked', 'off', 'all'])
});
export type AccountQuery = z.output<typeof accountQuery>;

/** Where to go after signing in: a path of this site only, or null. */
export function ownPath(to: string | null): string | null {
	const base = 'http://own.invalid';
	if (!to?.startsWith('/') || !URL.canParse(to, base)) return null;
	const url = new URL(to, base);
	return url.origin === base ? url.pathname + url.search + url.hash : null;
}

export const secondFactorBeginForm = z.object({
	password: z.string().min(1, 'Enter your password.').max(longestPassword)
});

export const secondFactorCodeForm = z.object({
	code: z.string().trim().min(1, 'Enter the six digits your authenticator shows.').max(12)
});

export const secondFactorRemoveForm = secondFactorBeginForm.extend({
	code: z.string().trim().max(12).default('')
});
