/** A path on this site to go on to, '/' for anything else: nobody is led away by a link. */
export function ownPath(wanted: unknown): string {
	if (typeof wanted !== 'string' || !wanted.startsWith('/')) return '/';
	const url = new URL(wanted, 'http://own.example');
	return url.host === 'own.example' && !wanted.startsWith('//') ? url.pathname + url.search : '/';
}
