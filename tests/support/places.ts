export const PURE = ['worth', 'trade', 'codes', 'units'];
/** In a line: each may use those to its left. */
export const AREAS = [
	...['people', 'tags', 'scan', 'photos', 'bins', 'prices', 'donors', 'parts'],
	...['find', 'labels', 'walks', 'yard', 'customers', 'wants', 'offers', 'sales', 'ledger']
];
export const PLUMBING = ['context', 'env', 'log', 'db', 'queue', 'mail', 'storage', 'http'];

export interface Back {
	what: 'back';
	room: string;
	inside: string;
}
export type Place =
	| Back
	| { what: 'pure' | 'front' | 'plumbing'; room: string; inside: string }
	| { what: 'ui' | 'format' | 'refusal' | 'jobs' | 'hooks' | 'route' | 'run' | 'other' }
	| { what: 'package' | 'unknown' };

function serverPlace(room: string, inside: string): Place {
	if (room === 'jobs' && inside === '') return { what: 'jobs' };
	if (AREAS.includes(room)) return { what: 'back', room, inside };
	if (PLUMBING.includes(room)) return { what: 'plumbing', room, inside };
	return { what: 'unknown' };
}

function libPlace(room: string, inside: string): Place {
	if (PURE.includes(room)) return { what: 'pure', room, inside };
	if (AREAS.includes(room)) return { what: 'front', room, inside };
	if (room === 'ui' || room === 'format' || room === 'refusal') return { what: room };
	return { what: 'unknown' };
}

/** Which room of the house a path or an import belongs to; `inside` is '' at the door. */
export function placeOf(target: string): Place {
	if (!target.startsWith('src/')) return { what: 'package' };
	const bare = target.replace(/\.(ts|js)$/, '').replace(/\/index$/, '');
	const [, top = '', room = '', ...rest] = bare.split('/');
	if (top === 'lib' && room === 'server') {
		return serverPlace(rest[0] ?? '', rest.slice(1).join('/'));
	}
	if (top === 'lib') return libPlace(room, rest.join('/'));
	if (top === 'routes') return { what: 'route' };
	if (top === 'run') return { what: 'run' };
	if (top === 'hooks.server') return { what: 'hooks' };
	return { what: 'other' };
}
