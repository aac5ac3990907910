// The photo store for one machine: speaks enough of S3 for the app, its objects are files on disk.
// It is not for the open internet: it listens on loopback and knows one pair of keys.
// Needs no npm package.
import { randomUUID } from 'node:crypto';
import { createServer } from 'node:http';
import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { listenRemembered } from '../ports.js';
import { readAddress } from './address.js';
import { Disk } from './disk.js';
import { choose } from './routes.js';
import { verify } from './signature.js';
import { Uploads } from './uploads.js';
import { S3Error, document } from './xml.js';

/** @typedef {import('node:http').IncomingMessage} Request */
/** @typedef {import('node:http').ServerResponse} Response */

/**
 * @param {{ dir: string, accessKey: string, secretKey: string, buckets?: string[] }} options
 * @returns {Promise<{ endpoint: string, port: number, stop: () => Promise<void> }>}
 */
export async function startStore({ dir, accessKey, secretKey, buckets = [] }) {
	mkdirSync(dir, { recursive: true });
	const disk = new Disk(dir);
	const uploads = new Uploads(join(dir, 'uploads'));
	for (const bucket of buckets) disk.makeBucket(bucket);
	const keys = { accessKey, secretKey };
	const server = createServer((request, response) => {
		answer(request, response, { disk, uploads, keys }).catch((error) =>
			refuse(request, response, error)
		);
	});
	// A large photo over a slow line takes its time.
	server.requestTimeout = 0;
	const port = await listenRemembered(server, join(dir, 'port'));
	const stop = () =>
		/** @type {Promise<void>} */ (
			new Promise((done) => {
				server.close(() => done());
				server.closeAllConnections();
			})
		);
	return { endpoint: `http://127.0.0.1:${port}`, port, stop };
}

/** @param {Request} request @param {Response} response @param {{ disk: Disk, uploads: Uploads, keys: import('./signing.js').Keys }} store */
async function answer(request, response, store) {
	allowPages(request, response);
	if (request.method === 'OPTIONS') {
		response.writeHead(204).end();
		return;
	}
	const address = readAddress(request.url ?? '/');
	const isForm =
		request.method === 'POST' &&
		(request.headers['content-type'] ?? '').startsWith('multipart/form-data');
	// A form carries its signature in its fields.
	const bodyHash = isForm ? 'UNSIGNED-PAYLOAD' : verify(request, address, store.keys);
	const verb = choose(request, address, isForm);
	await verb({ request, response, address, bodyHash, ...store });
}

/**
 * Pages of any origin may ask: what counts is the signature.
 * @param {Request} request
 * @param {Response} response
 */
function allowPages({ headers }, response) {
	response.setHeader('x-amz-request-id', randomUUID());
	if (!headers.origin) return;
	response.setHeader('access-control-allow-origin', '*');
	response.setHeader('access-control-expose-headers', 'etag, x-amz-request-id');
	response.setHeader('access-control-allow-methods', 'GET, HEAD, PUT, POST, DELETE');
	response.setHeader('access-control-max-age', '3600');
	const asked = headers['access-control-request-headers'];
	if (asked) response.setHeader('access-control-allow-headers', asked);
}

/** @param {Request} request @param {Response} response @param {unknown} error */
function refuse(request, response, error) {
	if (response.headersSent || response.destroyed) {
		response.destroy();
		return;
	}
	if (!(error instanceof S3Error)) console.error('photo store:', error);
	const known = error instanceof S3Error ? error : new S3Error(500, 'InternalError', 'It failed.');
	const body = document('Error', {
		Code: known.code,
		Message: known.message,
		Resource: request.url ?? '/',
		RequestId: String(response.getHeader('x-amz-request-id'))
	});
	response.writeHead(known.status, {
		'content-type': 'application/xml',
		'content-length': Buffer.byteLength(body)
	});
	response.end(request.method === 'HEAD' ? undefined : body);
}
