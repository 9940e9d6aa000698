import type { RateModelKind } from '../../domain/shelf-life/spec';

/** What each model is called, what it asks for, and its formula. */
export const modelWords: Record<RateModelKind, { name: string; asks: string; formula: string }> = {
	'constant-q10': {
		name: 'Constant Q10',
		asks: 'one figure for the whole range',
		formula: 'Q10^((T−Tref)/10)'
	},
	'two-lives': {
		name: 'Q10 from two storage lives',
		asks: 'two lives you trust',
		formula: '(l₁/l₂)^((T−Tref)/(T₂−T₁))'
	},
	'banded-q10': {
		name: 'Q10 by temperature band',
		asks: 'as postharvest tables print it',
		formula: '∏ Qᵢ^(ΔTᵢ/10)'
	},
	arrhenius: { name: 'Arrhenius', asks: 'activation energy', formula: 'e^(Ea/R(1/Tref−1/T))' },
	'life-table': {
		name: 'Storage-life table',
		asks: 'three points or more',
		formula: 'log-linear between points'
	},
	'square-root': { name: 'Square root', asks: 'fish, chilled meat', formula: '((T−Tmin)/(Tref−Tmin))^2' }
};

/** Short names for a table. */
export const modelShort: Record<RateModelKind, string> = {
	'constant-q10': 'Constant Q10',
	'two-lives': 'Two storage lives',
	'banded-q10': 'Q10 by band',
	arrhenius: 'Arrhenius',
	'life-table': 'Storage-life table',
	'square-root': 'Square root'
};
