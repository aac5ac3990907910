import { AcceptInput } from '$lib/people/input';
import { Refused } from '$lib/refusal';
import { acceptInvite, findInvite, visitorAction } from '$lib/server/people';

/** Open to whoever holds the link. */
export const load = async ({ params, locals }) => {
	try {
		const invite = await findInvite(locals.db, params.token, new Date());
		return { invite, me: locals.person, stopped: null };
	} catch (thrown) {
		if (thrown instanceof Error)
			return { invite: null, me: locals.person, stopped: thrown.message };
		throw thrown;
	}
};

export const actions = {
	default: visitorAction(AcceptInput, async (input, { params, locals }) => {
		const me = locals.person;
		const as = {
			personId: me?.id,
			email: me?.email,
			yourName: input.yourName,
			password: input.password
		};
		if (!params.token) throw new Refused('bad input', 'Open the link from the letter again.');
		const { slug } = await acceptInvite(locals.db, params.token, as, new Date());
		return { to: me ? `/${slug}/parts` : `/sign-in?to=/${slug}/parts` };
	})
};
