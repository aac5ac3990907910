import { encode } from './address.js';
import { entriesOf, sendXml } from './exchange.js';
import { badRequest } from './xml.js';

/** @typedef {import('./exchange.js').Exchange} Exchange */

/** @param {Exchange} exchange */
export async function listObjects(exchange) {
	const { query, bucket } = exchange.address;
	const entries = entriesOf(exchange);
	const second = query.get('list-type') === '2';
	const prefix = query.get('prefix') ?? '';
	const delimiter = query.get('delimiter') ?? '';
	const most = readMost(query.get('max-keys'));
	const after = startOf(query, second);
	const { keys, folders, next } = page(exchange.disk.keys(bucket), {
		prefix,
		delimiter,
		most,
		after
	});
	const name = query.get('encoding-type') === 'url' ? encodeKey : String;
	sendXml(exchange, 200, 'ListBucketResult', {
		Name: bucket,
		Prefix: name(prefix),
		Delimiter: delimiter ? name(delimiter) : undefined,
		MaxKeys: most,
		EncodingType: query.get('encoding-type'),
		KeyCount: second ? keys.length + folders.length : undefined,
		IsTruncated: next !== null,
		NextContinuationToken: next !== null && second ? toToken(next) : undefined,
		NextMarker: next !== null && !second ? name(next) : undefined,
		Contents: keys.map((key) => describe(name(key), entries.get(key))),
		CommonPrefixes: folders.map((folder) => ({ Prefix: name(folder) }))
	});
}

/** @param {string | undefined} text */
function readMost(text) {
	const most = Number(text ?? 1000);
	if (!Number.isInteger(most) || most < 0) throw badRequest('InvalidArgument', 'max-keys is odd.');
	return Math.min(most, 1000);
}

/** @param {Map<string, string>} query @param {boolean} second */
function startOf(query, second) {
	if (!second) return query.get('marker') ?? '';
	const token = query.get('continuation-token');
	return token ? Buffer.from(token, 'base64url').toString() : (query.get('start-after') ?? '');
}

/** @param {string} last */
const toToken = (last) => Buffer.from(last).toString('base64url');

/** @param {string} key */
const encodeKey = (key) => key.split('/').map(encode).join('/');

/** @param {string} Key @param {import('./disk.js').Entry | undefined} entry */
function describe(Key, entry) {
	const { modified, etag, size } = entry ?? {};
	return { Key, LastModified: modified, ETag: `"${etag}"`, Size: size, StorageClass: 'STANDARD' };
}

/**
 * One page of keys; those that share a folder after the prefix are folded into it.
 * @param {string[]} all in order
 * @param {{ prefix: string, delimiter: string, most: number, after: string }} wanted
 */
export function page(all, { prefix, delimiter, most, after }) {
	/** @type {string[]} */
	const keys = [];
	/** @type {string[]} */
	const folders = [];
	let last = '';
	const start = Buffer.from(after);
	for (const key of all) {
		if (!key.startsWith(prefix)) continue;
		const cut = delimiter ? key.indexOf(delimiter, prefix.length) : -1;
		const folder = cut < 0 ? null : key.slice(0, cut + delimiter.length);
		if (folder !== null && folder === folders.at(-1)) continue;
		if (after && Buffer.compare(Buffer.from(folder ?? key), start) <= 0) continue;
		if (keys.length + folders.length >= most) return { keys, folders, next: most ? last : null };
		last = folder ?? key;
		(folder === null ? keys : folders).push(last);
	}
	return { keys, folders, next: null };
}
