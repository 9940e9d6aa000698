export const kindWords = { reusable: 'Reusable', 'one-trip': 'One trip' } as const;

export const stateFilters = [
	{ value: 'in-use', label: 'In use' },
	{ value: 'overdue', label: 'Calibration overdue' },
	{ value: 'off', label: 'Switched off' },
	{ value: 'all', label: 'Every' }
] as const;

export const kindFilters = [
	{ value: 'any', label: 'All' },
	{ value: 'reusable', label: 'Reusable' },
	{ value: 'one-trip', label: 'One trip' }
] as const;
