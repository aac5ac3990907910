import { createHash } from 'node:crypto';
import { S3Error, badRequest, document } from './xml.js';

/**
 * One request with what is known of it, handed to the verbs.
 * @typedef {object} Exchange
 * @property {import('node:http').IncomingMessage} request
 * @property {import('node:http').ServerResponse} response
 * @property {import('./address.js').Address} address
 * @property {import('./disk.js').Disk} disk
 * @property {import('./uploads.js').Uploads} uploads
 * @property {string} bodyHash the sha256 that was signed, or UNSIGNED-PAYLOAD
 * @property {import('./signing.js').Keys} keys
 */

const largestBody = 4 * 1024 * 1024;

/** @param {Exchange} exchange @param {number} status @param {string} name @param {import('./xml.js').XmlTree} tree */
export function sendXml({ response }, status, name, tree) {
	const body = document(name, tree);
	response.writeHead(status, {
		'content-type': 'application/xml',
		'content-length': Buffer.byteLength(body)
	});
	response.end(body);
}

/** @param {Exchange} exchange @param {number} status @param {Record<string, string>} [headers] */
export function sendEmpty({ response }, status, headers = {}) {
	response.writeHead(status, status === 204 ? headers : { ...headers, 'content-length': '0' });
	response.end();
}

/**
 * The body of a small request such as a list of keys.
 * @param {Exchange} exchange
 * @returns {Promise<string>}
 */
export async function readText({ request, bodyHash }) {
	const chunks = [];
	let size = 0;
	for await (const chunk of request) {
		size += chunk.length;
		if (size > largestBody) throw badRequest('MaxMessageLengthExceeded', 'The body is too long.');
		chunks.push(chunk);
	}
	const body = Buffer.concat(chunks);
	checkHash(bodyHash, createHash('sha256').update(body).digest('hex'));
	return body.toString('utf8');
}

/** @param {string} signed @param {string} found */
export function checkHash(signed, found) {
	if (signed === 'UNSIGNED-PAYLOAD' || signed === found) return;
	throw badRequest('XAmzContentSHA256Mismatch', 'The body is not the one that was signed.');
}

/** @param {Exchange} exchange @returns {Map<string, import('./disk.js').Entry>} */
export function entriesOf({ disk, address }) {
	const entries = disk.buckets.get(address.bucket);
	if (!entries) throw new S3Error(404, 'NoSuchBucket', 'There is no such bucket.');
	return entries;
}

const kept = ['content-type', 'content-disposition', 'content-encoding', 'content-language'];
kept.push('cache-control', 'expires');

/**
 * The headers that belong to the object and come back with it.
 * @param {Record<string, string | string[] | undefined>} headers
 * @returns {Record<string, string>}
 */
export function ownHeaders(headers) {
	const own = Object.entries(headers).filter(
		([name, value]) =>
			value !== undefined && (kept.includes(name) || name.startsWith('x-amz-meta-'))
	);
	return { 'content-type': 'binary/octet-stream', ...Object.fromEntries(own.map(toText)) };
}

/** @param {[string, string | string[] | undefined]} header @returns {[string, string]} */
const toText = ([name, value]) => [name, String(value)];
