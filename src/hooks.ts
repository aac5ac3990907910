import type { Reroute } from '@sveltejs/kit';

/** Printed codes are in upper case, which packs them smaller; their addresses are read in lower case. */
export const reroute: Reroute = ({ url }) =>
	/^\/t\//i.test(url.pathname) ? url.pathname.toLowerCase() : undefined;
