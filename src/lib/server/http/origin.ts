import type { RequestEvent } from '@sveltejs/kit';

const LOOKS_ONLY = ['GET', 'HEAD', 'OPTIONS'];

/**
 * A change that another site's page may have sent with our visitor's cookie. A script that carries a key
 * sends no cookie that counts, and no origin.
 */
export function fromElsewhere({ request, url }: RequestEvent): boolean {
	if (LOOKS_ONLY.includes(request.method) || bearer(request)) return false;
	if (isMailProgram(request, url)) return false;
	return request.headers.get('origin') !== url.origin;
}

/** A mail program stops letters by the link in one, for its reader: the link is all that counts, no cookie is read. */
const isMailProgram = (request: Request, url: URL): boolean =>
	request.method === 'POST' &&
	request.headers.get('origin') === null &&
	/^\/letters\/[\w-]{20,}$/.test(url.pathname) &&
	url.search === '';

/** The key of a script, if one is sent. */
export const bearer = (request: Request): string | undefined =>
	request.headers.get('authorization')?.match(/^Bearer (\S+)$/i)?.[1];
