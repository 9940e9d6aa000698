/** Stands under every assessment and report. */
export const caution =
	'An estimate of quality from temperature alone. It says nothing about pathogens, toxins (histamine, botulinum), contamination, freezing damage or physical injury, and it never overrides a food-safety limit, a HACCP plan, a medicine’s or vaccine’s stability data, or the decision of the responsible person or the authority.';

/** Stands beside every clock. */
export const clockCaution = 'An aid, not legal advice: contract and local law govern.';
