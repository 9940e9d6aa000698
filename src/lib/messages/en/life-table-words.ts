import type { FitFault } from '../../domain/shelf-life/fit-lines';
import type { LifeTableFault, LifeTableFaultCode } from '../../schemas/life-table-text';

const faultSentences: Record<LifeTableFaultCode, string> = {
	'not-two-figures': 'is not a temperature and a life. Write two figures, such as 5 14.',
	'ambiguous-commas': 'has commas that may be decimal or may part figures. Part them with a semicolon.',
	'below-absolute-zero': 'is colder than anything can be. Look at the sign and the unit.',
	'life-not-positive': 'has a life of nothing. Enter more than 0, or leave the line out.',
	'too-many-lines': 'is where reading ended: 500 lines are the most. Leave the rest out.'
};

/** "Line 3, “5 d”, is not a temperature and a life. …" */
export function lifeTableFaultSentence({ line, text, code }: LifeTableFault): string {
	const shown = text.length > 40 ? `${text.slice(0, 40)}…` : text;
	return `Line ${line}, “${shown}”, ${faultSentences[code]}`;
}

/** Why a kind of model does not fit a table. */
export const fitFaultSentences: Record<FitFault, string> = {
	'points-too-few': 'needs lives at two temperatures or more',
	'life-longer-when-warmer': 'these lives are longer when warmer; look at the temperatures',
	'minimum-not-settled': 'these lives leave Tmin open; it needs more of a bend'
};
