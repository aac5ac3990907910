import { ownPath } from '$lib/people/own-path';
import { redirect, type RequestHandler } from '@sveltejs/kit';

const THEMES = ['light', 'dark', 'sunlight'];

/** Open to everybody: how this device shows the pages. */
export const POST: RequestHandler = async ({ request, cookies, url }) => {
	const form = await request.formData();
	const theme = String(form.get('theme'));
	const options = { path: '/', maxAge: 365 * 86_400, secure: url.protocol === 'https:' };
	if (THEMES.includes(theme)) cookies.set('theme', theme, options);
	else cookies.delete('theme', options);
	redirect(303, ownPath(form.get('back')));
};
