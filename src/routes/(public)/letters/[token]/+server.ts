import { NotFound } from '$lib/refusal';
import { stopLetters } from '$lib/server/customers';

/** Open to whoever holds the link of a letter: a mail program stops the letters by one tap of its reader. */
export const POST = async ({ params, locals }) => {
	try {
		await stopLetters(locals.db, params.token, new Date());
		return new Response('No more letters.');
	} catch (thrown) {
		if (thrown instanceof NotFound) return new Response(thrown.message, { status: 404 });
		throw thrown;
	}
};
