import type { ParamMatcher } from '@sveltejs/kit';

/** A shop's name in an address. */
export const match: ParamMatcher = (param) => /^[a-z0-9](?:[a-z0-9-]{0,46}[a-z0-9])?$/i.test(param);
