import { PasswordChange } from '$lib/people/input';
import { NotFound } from '$lib/refusal';
import { setPassword, visitorAction } from '$lib/server/people';
import { redirect } from '@sveltejs/kit';

/** For whoever is signed in, by password or by link. */
export const load = ({ locals }) => {
	if (!locals.person) redirect(303, '/sign-in?to=/reset');
	return { email: locals.person.email };
};

export const actions = {
	default: visitorAction(PasswordChange, async ({ password }, { locals }) => {
		if (!locals.person) throw new NotFound();
		await setPassword(locals.db, locals.person.id, password, new Date());
		return { to: '/sign-in' };
	})
};
