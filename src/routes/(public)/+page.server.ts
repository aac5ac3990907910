import { redirect } from '@sveltejs/kit';

/** Open to everybody; who is signed in goes on to the shop. */
export const load = ({ locals }) => {
	if (locals.person) redirect(303, '/choose-shop');
};
