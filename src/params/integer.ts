import type { ParamMatcher } from '@sveltejs/kit';

/** A row's own number; never longer than the database and JavaScript both hold exactly. */
export const match: ParamMatcher = (param) => /^[1-9][0-9]{0,14}$/.test(param);
