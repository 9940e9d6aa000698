import type { AccountRole } from '$lib/schemas/account';

export const roleWords: Record<AccountRole, string> = {
	dock: 'Dock',
	qa: 'QA',
	claims: 'Claims',
	admin: 'Admin',
	supplier: 'Supplier'
};

export const roleNotes: Record<AccountRole, string> = {
	dock: 'logs arrivals, uploads reads',
	qa: 'weighs the evidence and signs',
	claims: 'works on claims',
	admin: 'keeps specs, partners, sites and people',
	supplier: 'sees its own firm’s loads, by mailed link'
};

export const stateWords = {
	active: 'In use',
	invited: 'Invited',
	locked: 'Locked',
	off: 'Switched off'
} as const;

export const roleFilters = [
	{ value: 'any', label: 'All' },
	{ value: 'dock', label: 'Dock' },
	{ value: 'qa', label: 'QA' },
	{ value: 'claims', label: 'Claims' },
	{ value: 'admin', label: 'Admin' },
	{ value: 'supplier', label: 'Supplier' }
] as const;

export const stateFilters = [
	{ value: 'in-use', label: 'In use' },
	{ value: 'invited', label: 'Invited' },
	{ value: 'locked', label: 'Locked' },
	{ value: 'off', label: 'Switched off' },
	{ value: 'all', label: 'Every' }
] as const;
