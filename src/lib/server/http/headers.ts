import type { RequestEvent } from '@sveltejs/kit';
import { overTls } from '../env';

/** The headers of every answer; the content security policy comes from the framework. */
export function headers(event: RequestEvent): [string, string][] {
	const always: [string, string][] = [
		['X-Content-Type-Options', 'nosniff'],
		['X-Frame-Options', 'DENY'],
		['Referrer-Policy', 'same-origin'],
		['Permissions-Policy', 'camera=(self), microphone=(), geolocation=(), payment=()'],
		['Cross-Origin-Opener-Policy', 'same-origin'],
		['Cross-Origin-Resource-Policy', 'same-origin']
	];
	if (overTls()) always.push(['Strict-Transport-Security', 'max-age=63072000; includeSubDomains']);
	if (event.url.pathname.startsWith('/api/'))
		always.push(['Content-Security-Policy', "default-src 'none'; frame-ancestors 'none'"]);
	return always;
}
