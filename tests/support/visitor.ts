import { request, type APIRequestContext } from '@playwright/test';

export const PASSWORD = 'endplay demo shop';
export const BASE = process.env.E2E_BASE_URL ?? 'http://localhost:3000';

/** A visitor without a browser; signed in by the form when an address is given. */
export async function visitor(email?: string): Promise<APIRequestContext> {
	const context = await request.newContext({
		baseURL: BASE,
		maxRedirects: 0,
		extraHTTPHeaders: { origin: BASE }
	});
	if (!email) return context;
	const form = { providerId: 'credentials', email, password: PASSWORD, redirectTo: '/' };
	const answer = await context.post('/sign-in?/password', { form });
	if (answer.status() >= 400) throw new Error(`${email} could not sign in: ${answer.status()}`);
	return context;
}
