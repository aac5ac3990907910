import { redirect } from '@sveltejs/kit';

/** For whoever is signed in; with one shop there is nothing to choose. */
export const load = ({ locals, url }) => {
	if (!locals.person) redirect(303, '/sign-in');
	const [only, ...others] = locals.shops;
	if (only && others.length === 0 && !url.searchParams.has('all'))
		redirect(303, `/${only.slug}/parts`);
	return { shops: locals.shops, me: locals.person };
};
