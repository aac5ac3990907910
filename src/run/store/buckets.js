import { entriesOf, readText, sendEmpty, sendXml } from './exchange.js';
import { S3Error, badRequest, blocks, texts } from './xml.js';

/** @typedef {import('./exchange.js').Exchange} Exchange */

/** @param {Exchange} exchange */
export async function listBuckets(exchange) {
	const names = [...exchange.disk.buckets.keys()].sort();
	const Bucket = names.map((Name) => ({ Name, CreationDate: new Date(0).toISOString() }));
	sendXml(exchange, 200, 'ListAllMyBucketsResult', { Buckets: { Bucket } });
}

/** @param {Exchange} exchange */
export async function makeBucket(exchange) {
	const { bucket } = exchange.address;
	if (!/^[a-z0-9][a-z0-9.-]{1,61}[a-z0-9]$/.test(bucket)) {
		throw badRequest(
			'InvalidBucketName',
			'A bucket is named with small letters, figures, dots, dashes.'
		);
	}
	if (exchange.disk.buckets.has(bucket)) {
		throw new S3Error(409, 'BucketAlreadyOwnedByYou', 'There is such a bucket already.');
	}
	exchange.disk.makeBucket(bucket);
	sendEmpty(exchange, 200, { location: `/${bucket}` });
}

/** @param {Exchange} exchange */
export async function headBucket(exchange) {
	entriesOf(exchange);
	sendEmpty(exchange, 200);
}

/** @param {Exchange} exchange */
export async function removeBucket(exchange) {
	if (entriesOf(exchange).size > 0) {
		throw new S3Error(409, 'BucketNotEmpty', 'The bucket still has objects.');
	}
	exchange.disk.removeBucket(exchange.address.bucket);
	sendEmpty(exchange, 204);
}

/** @param {Exchange} exchange */
export async function locateBucket(exchange) {
	entriesOf(exchange);
	sendXml(exchange, 200, 'LocationConstraint', {});
}

/** @param {Exchange} exchange */
export async function deleteMany(exchange) {
	const { bucket } = exchange.address;
	entriesOf(exchange);
	const body = await readText(exchange);
	const keys = blocks(body, 'Object').flatMap((object) => texts(object, 'Key'));
	if (keys.length > 1000) throw badRequest('MalformedXML', 'At most 1000 keys at once.');
	for (const key of keys) exchange.disk.remove(bucket, key);
	const quiet = texts(body, 'Quiet')[0] === 'true';
	const Deleted = quiet ? [] : keys.map((Key) => ({ Key }));
	sendXml(exchange, 200, 'DeleteResult', { Deleted });
}
