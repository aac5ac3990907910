import { overTls } from '../env';

/** For answers that are no page of the framework: data, pictures, plain words. */
export const BARE_POLICY =
	"default-src 'none'; style-src 'unsafe-inline'; base-uri 'none'; form-action 'self'; frame-ancestors 'none'";

/** The headers of every answer; a page's content security policy comes from the framework. */
export function headers(): [string, string][] {
	const always: [string, string][] = [
		['X-Content-Type-Options', 'nosniff'],
		['X-Frame-Options', 'DENY'],
		['Referrer-Policy', 'same-origin'],
		['Permissions-Policy', 'camera=(self), microphone=(), geolocation=(), payment=()'],
		['Cross-Origin-Opener-Policy', 'same-origin'],
		['Cross-Origin-Resource-Policy', 'same-origin']
	];
	if (overTls()) always.push(['Strict-Transport-Security', 'max-age=63072000; includeSubDomains']);
	return always;
}
