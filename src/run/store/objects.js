import { createReadStream } from 'node:fs';
import { decode } from './address.js';
import { checkHash, entriesOf, ownHeaders, sendEmpty, sendXml } from './exchange.js';
import { S3Error, badRequest } from './xml.js';

/** @typedef {import('./exchange.js').Exchange} Exchange */
/** @typedef {import('./disk.js').Entry} Entry */

const largestObject = 5 * 1024 ** 3;

/** @param {Exchange} exchange */
export async function putObject(exchange) {
	const { request, disk, address } = exchange;
	const entries = entriesOf(exchange);
	checkKey(address.key);
	const written = await writeBody(exchange);
	if (request.headers['if-none-match'] === '*' && entries.has(address.key)) {
		disk.blobs.drop(written.blob);
		throw new S3Error(412, 'PreconditionFailed', 'There is such an object already.');
	}
	keep(exchange, written, ownHeaders(request.headers));
	sendEmpty(exchange, 200, { etag: `"${written.md5}"` });
}

/** @param {string} key */
export function checkKey(key) {
	if (Buffer.byteLength(key) > 1024) throw badRequest('KeyTooLongError', 'The key is too long.');
}

/**
 * Writes the body of a request under a fresh name, and takes it back when it is not what was announced.
 * @param {Exchange} exchange
 */
async function writeBody({ request, disk, bodyHash }) {
	checkLength(request);
	const written = await disk.blobs.write(request);
	try {
		checkBody(request, bodyHash, written);
	} catch (error) {
		disk.blobs.drop(written.blob);
		throw error;
	}
	return written;
}

/** @param {import('node:http').IncomingMessage} request */
export function checkLength({ headers }) {
	const length = headers['content-length'];
	if (length === undefined)
		throw new S3Error(411, 'MissingContentLength', 'The length is missing.');
	if (Number(length) > largestObject)
		throw badRequest('EntityTooLarge', 'The object is too large.');
}

/** @param {import('node:http').IncomingMessage} request @param {string} bodyHash @param {{ size: number, md5: string, sha256: string }} written */
export function checkBody({ headers }, bodyHash, written) {
	if (written.size !== Number(headers['content-length'])) {
		throw badRequest('IncompleteBody', 'The body is shorter than announced.');
	}
	checkHash(bodyHash, written.sha256);
	const md5 = headers['content-md5'];
	if (md5 && Buffer.from(String(md5), 'base64').toString('hex') !== written.md5) {
		throw badRequest('BadDigest', 'The body does not match its Content-MD5.');
	}
}

/** @param {Exchange} exchange @param {{ blob: string, size: number, md5: string }} written @param {Record<string, string>} headers */
export function keep({ disk, address }, { blob, size, md5 }, headers) {
	const modified = new Date().toISOString();
	/** @type {Entry} */
	const entry = { key: address.key, blob, size, etag: md5, modified, headers };
	disk.put(address.bucket, entry);
	return entry;
}

/** @param {Exchange} exchange */
export async function copyObject(exchange) {
	const { request, disk, address } = exchange;
	entriesOf(exchange);
	checkKey(address.key);
	const source = decode(String(request.headers['x-amz-copy-source'])).replace(/^\//, '');
	const slash = source.indexOf('/');
	const from = disk.buckets.get(source.slice(0, slash))?.get(source.slice(slash + 1));
	if (!from) throw new S3Error(404, 'NoSuchKey', 'There is nothing to copy under this key.');
	const replaced = request.headers['x-amz-metadata-directive'] === 'REPLACE';
	const written = await disk.blobs.write(createReadStream(disk.blobs.path(from.blob)));
	const headers = replaced ? ownHeaders(request.headers) : from.headers;
	const { etag, modified } = keep(exchange, written, headers);
	sendXml(exchange, 200, 'CopyObjectResult', { LastModified: modified, ETag: `"${etag}"` });
}

/** @param {Exchange} exchange */
export async function deleteObject(exchange) {
	entriesOf(exchange);
	exchange.disk.remove(exchange.address.bucket, exchange.address.key);
	sendEmpty(exchange, 204);
}
