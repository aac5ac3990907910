import * as buckets from './buckets.js';
import { listObjects } from './listing.js';
import * as multipart from './multipart.js';
import * as objects from './objects.js';
import { postObject } from './policy.js';
import { getObject } from './reading.js';
import { S3Error } from './xml.js';

/** @typedef {(exchange: import('./exchange.js').Exchange) => Promise<void>} Verb */

/**
 * @param {import('node:http').IncomingMessage} request
 * @param {import('./address.js').Address} address
 * @param {boolean} isForm
 * @returns {Verb}
 */
export function choose(request, address, isForm) {
	const verb = address.key
		? forObject(request, address.query)
		: address.bucket
			? forBucket(request.method ?? '', address.query, isForm)
			: request.method === 'GET' && buckets.listBuckets;
	if (verb && !(isForm && verb !== postObject)) return verb;
	throw new S3Error(501, 'NotImplemented', 'This is not spoken here.');
}

/** @param {string} method @param {Map<string, string>} query @param {boolean} isForm */
function forBucket(method, query, isForm) {
	const asked = notSpoken.find((name) => query.has(name));
	if (asked) throw new S3Error(501, 'NotImplemented', `${asked} is not spoken here.`);
	if (method === 'GET' && query.has('location')) return buckets.locateBucket;
	if (method === 'GET' && query.has('uploads')) return multipart.listUploads;
	if (method === 'GET') return listObjects;
	if (method === 'POST' && isForm) return postObject;
	if (method === 'POST' && query.has('delete')) return buckets.deleteMany;
	return { HEAD: buckets.headBucket, PUT: buckets.makeBucket, DELETE: buckets.removeBucket }[
		method
	];
}

const notSpoken = [
	'acl',
	'cors',
	'encryption',
	'lifecycle',
	'notification',
	'object-lock',
	'policy'
];
notSpoken.push('replication', 'tagging', 'versioning', 'versions', 'website');

/** @param {import('node:http').IncomingMessage} request @param {Map<string, string>} query */
function forObject({ method = '', headers }, query) {
	const asked = notSpoken.find((name) => query.has(name));
	if (asked) throw new S3Error(501, 'NotImplemented', `${asked} is not spoken here.`);
	if (query.has('uploadId')) {
		const { putPart, completeUpload, abortUpload, listParts } = multipart;
		const verbs = { PUT: putPart, POST: completeUpload, DELETE: abortUpload, GET: listParts };
		return /** @type {Record<string, Verb>} */ (verbs)[method];
	}
	if (method === 'POST' && query.has('uploads')) return multipart.beginUpload;
	if (method === 'PUT' && headers['x-amz-copy-source']) return objects.copyObject;
	const verbs = { GET: getObject, HEAD: getObject, PUT: objects.putObject };
	return /** @type {Record<string, Verb>} */ ({ ...verbs, DELETE: objects.deleteObject })[method];
}
