import { ownPath } from '$lib/people/own-path';
import { signIn, SignInFailed } from '$lib/server/people';
import { fail, isRedirect, redirect, type RequestEvent } from '@sveltejs/kit';

/** Open to everybody. */
export const load = ({ locals, url }) => {
	const to = ownPath(url.searchParams.get('to'));
	if (locals.person) redirect(303, to === '/' ? '/choose-shop' : to);
	return {
		to: to === '/' ? '/choose-shop' : to,
		linkFailed: url.searchParams.get('error') !== null
	};
};

const wait = (seconds: number) =>
	seconds < 90 ? `${seconds} seconds` : `${Math.ceil(seconds / 60)} minutes`;

function words(failed: unknown): { status: number; field: string; message: string } {
	if (failed instanceof SignInFailed && failed.waitSeconds > 0)
		return {
			status: 429,
			field: 'password',
			message: `Too many wrong tries for this address. Try again in ${wait(failed.waitSeconds)}, or ask for a sign-in link.`
		};
	if (failed instanceof SignInFailed)
		return {
			status: 400,
			field: 'password',
			message:
				'This e-mail and password do not belong together. Check both, or ask for a sign-in link.'
		};
	return {
		status: 503,
		field: 'email',
		message: 'The letter could not be sent just now. Try again in a minute.'
	};
}

async function enter(event: RequestEvent) {
	const form = await event.request.clone().formData();
	const email = String(form.get('email') ?? '').trim();
	if (!email)
		return fail(400, {
			email,
			problems: [{ field: 'email', message: 'Enter your e-mail address' }]
		});
	try {
		await signIn(event);
	} catch (failed) {
		if (isRedirect(failed)) throw failed;
		const { status, field, message } = words(failed);
		return fail(status, { email, problems: [{ field, message }] });
	}
}

export const actions = { password: enter, link: enter };
