import type { ParamMatcher } from '@sveltejs/kit';

/** A docket's number as printed: site prefix, year, running number. */
export const match: ParamMatcher = (text) => /^[A-Z0-9]{1,8}-\d{2}-\d{1,6}$/.test(text);
