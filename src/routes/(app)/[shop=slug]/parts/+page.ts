import type { PageLoad } from './$types';

/** The table comes only to those who ask for it. */
export const load: PageLoad = async ({ data }) => ({
	...data,
	Table: data.question.view === 'table' ? (await import('./PartsTable.svelte')).default : null
});
