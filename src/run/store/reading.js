import { open } from 'node:fs/promises';
import { pipeline } from 'node:stream/promises';
import { entriesOf } from './exchange.js';
import { S3Error } from './xml.js';

/** @typedef {import('./exchange.js').Exchange} Exchange */
/** @typedef {import('./disk.js').Entry} Entry */

/** @param {Exchange} exchange */
export async function getObject(exchange) {
	const { request, response, disk, address } = exchange;
	const entry = entriesOf(exchange).get(address.key);
	if (!entry) throw new S3Error(404, 'NoSuchKey', 'There is no object under this key.');
	const headers = headersOf(exchange, entry);
	if (request.headers['if-none-match'] === `"${entry.etag}"`) {
		response.writeHead(304, headers).end();
		return;
	}
	const range = readRange(request.headers.range, entry.size);
	const { start, end } = range ?? { start: 0, end: entry.size - 1 };
	headers['content-length'] = String(end - start + 1);
	if (range) headers['content-range'] = `bytes ${start}-${end}/${entry.size}`;
	const status = range ? 206 : 200;
	if (request.method === 'HEAD' || entry.size === 0) {
		response.writeHead(status, headers).end();
		return;
	}
	// Opened before the answer: whoever overwrites the object now does not disturb this reader.
	const file = await open(disk.blobs.path(entry.blob));
	response.writeHead(status, headers);
	await pipeline(file.createReadStream({ start, end }), response).catch(() => response.destroy());
}

/** @param {Exchange} exchange @param {Entry} entry @returns {Record<string, string>} */
function headersOf({ address }, entry) {
	const asked = address.pairs.filter(([name]) => name.startsWith('response-'));
	return {
		...entry.headers,
		...Object.fromEntries(asked.map(([name, value]) => [name.slice('response-'.length), value])),
		etag: `"${entry.etag}"`,
		'last-modified': new Date(entry.modified).toUTCString(),
		'accept-ranges': 'bytes'
	};
}

/** @param {string | undefined} text @param {number} size */
function readRange(text, size) {
	const match = /^bytes=(\d*)-(\d*)$/.exec(text ?? '');
	if (!match || (!match[1] && !match[2])) return null;
	const start = match[1] ? Number(match[1]) : Math.max(0, size - Number(match[2]));
	const end = match[1] && match[2] ? Math.min(Number(match[2]), size - 1) : size - 1;
	if (start < size && start <= end) return { start, end };
	throw new S3Error(416, 'InvalidRange', 'The range lies outside the object.');
}
