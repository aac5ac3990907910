import { currencies, SignUp, timeZones } from '$lib/people/input';
import { openAnother, signUp, visitorAction } from '$lib/server/people';

/** Open to everybody; who is signed in opens a further shop. */
export const load = ({ locals }) => ({
	currencies: currencies(),
	timeZones: timeZones(),
	signedIn: locals.person !== null
});

const NewShop = SignUp.pick({ shopName: true, currency: true, timeZone: true, units: true });

export const actions = {
	new: visitorAction(SignUp, async (input, { locals }) => {
		const { slug } = await signUp(locals.db, input, new Date());
		return { to: `/sign-in?to=/${slug}/donors` };
	}),
	another: visitorAction(NewShop, async (input, { locals }) => {
		if (!locals.person) return { to: '/sign-in?to=/sign-up' };
		const owner = { personId: locals.person.id, name: locals.person.name };
		const { slug } = await openAnother(locals.db, input, owner, new Date());
		return { to: `/${slug}/donors` };
	})
};
