import { findLetter, startLetters, stopLetters } from '$lib/server/customers';
import { visitorAction } from '$lib/server/people';
import { Nothing } from '$lib/customers/input';
import type { RequestEvent } from './$types';

/** Open to whoever holds the link of a letter; looking at it changes nothing, as mail programs look at links by themselves. */
export const load = async ({ params, locals }) => {
	try {
		return { letter: await findLetter(locals.db, params.token), stopped: null };
	} catch (thrown) {
		if (thrown instanceof Error) return { letter: null, stopped: thrown.message };
		throw thrown;
	}
};

const by = (act: typeof stopLetters) =>
	visitorAction(Nothing, async (_input, { params, locals, url }: RequestEvent) => {
		await act(locals.db, params.token, new Date());
		return { to: url.pathname };
	});

export const actions = { stop: by(stopLetters), start: by(startLetters) };
