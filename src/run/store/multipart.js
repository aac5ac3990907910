import { createHash } from 'node:crypto';
import { entriesOf, ownHeaders, readText, sendEmpty, sendXml } from './exchange.js';
import { checkBody, checkKey, checkLength, keep } from './objects.js';
import { badRequest, blocks, texts } from './xml.js';

/** @typedef {import('./exchange.js').Exchange} Exchange */

const smallestPart = 5 * 1024 * 1024;

/** @param {Exchange} exchange */
const uploadOf = ({ uploads, address: { bucket, key, query } }) =>
	uploads.get(query.get('uploadId') ?? '', bucket, key);

/** @param {Exchange} exchange */
export async function beginUpload(exchange) {
	const { bucket, key } = exchange.address;
	entriesOf(exchange);
	checkKey(key);
	const headers = ownHeaders(exchange.request.headers);
	const { id } = exchange.uploads.begin({ bucket, key, headers });
	const tree = { Bucket: bucket, Key: key, UploadId: id };
	sendXml(exchange, 200, 'InitiateMultipartUploadResult', tree);
}

/** @param {Exchange} exchange */
export async function putPart(exchange) {
	const { request, uploads, address, bodyHash } = exchange;
	const upload = uploadOf(exchange);
	const number = Number(address.query.get('partNumber'));
	if (!Number.isInteger(number) || number < 1 || number > 10_000) {
		throw badRequest('InvalidArgument', 'Parts are numbered from 1 to 10000.');
	}
	checkLength(request);
	const { md5 } = await uploads.addPart(upload, number, request, (written) =>
		checkBody(request, bodyHash, written)
	);
	sendEmpty(exchange, 200, { etag: `"${md5}"` });
}

/** @param {Exchange} exchange */
export async function completeUpload(exchange) {
	const { uploads, disk, address } = exchange;
	entriesOf(exchange);
	const upload = uploadOf(exchange);
	const parts = chosenParts(uploads.parts(upload), await readText(exchange));
	const written = await disk.blobs.write(uploads.bytes(upload, parts));
	const joined = Buffer.concat(parts.map((part) => Buffer.from(part.md5, 'hex')));
	const md5 = `${createHash('md5').update(joined).digest('hex')}-${parts.length}`;
	const { etag } = keep(exchange, { ...written, md5 }, upload.headers);
	uploads.drop(upload);
	const { bucket, key } = address;
	const tree = { Location: `/${bucket}/${key}`, Bucket: bucket, Key: key, ETag: `"${etag}"` };
	sendXml(exchange, 200, 'CompleteMultipartUploadResult', tree);
}

/**
 * @template {import('./uploads.js').Part} P
 * @param {P[]} there
 * @param {string} body the list of numbers and etags
 * @returns {P[]}
 */
function chosenParts(there, body) {
	const wanted = blocks(body, 'Part').map((part) => ({
		number: Number(texts(part, 'PartNumber')[0]),
		etag: (texts(part, 'ETag')[0] ?? '').replaceAll('"', '')
	}));
	if (wanted.length === 0) throw badRequest('MalformedXML', 'No parts are named.');
	return wanted.map(({ number, etag }, at) => {
		const part = there.find((one) => one.number === number);
		if (!part || part.md5 !== etag) throw badRequest('InvalidPart', `Part ${number} is not here.`);
		if (at > 0 && number <= (wanted[at - 1]?.number ?? 0)) {
			throw badRequest('InvalidPartOrder', 'The parts are not in order.');
		}
		if (at < wanted.length - 1 && part.size < smallestPart) {
			throw badRequest('EntityTooSmall', `Part ${number} is smaller than 5 MB.`);
		}
		return part;
	});
}

/** @param {Exchange} exchange */
export async function abortUpload(exchange) {
	exchange.uploads.drop(uploadOf(exchange));
	sendEmpty(exchange, 204);
}

/** @param {Exchange} exchange */
export async function listParts(exchange) {
	const upload = uploadOf(exchange);
	const Part = exchange.uploads.parts(upload).map(({ number, size, md5, modified }) => ({
		PartNumber: number,
		LastModified: modified,
		ETag: `"${md5}"`,
		Size: size
	}));
	const { bucket, key, id } = upload;
	const tree = { Bucket: bucket, Key: key, UploadId: id, IsTruncated: false, Part };
	sendXml(exchange, 200, 'ListPartsResult', tree);
}

/** @param {Exchange} exchange */
export async function listUploads(exchange) {
	const { bucket, query } = exchange.address;
	entriesOf(exchange);
	const prefix = query.get('prefix') ?? '';
	const open = exchange.uploads
		.all()
		.filter((upload) => upload.bucket === bucket && upload.key.startsWith(prefix))
		.sort((a, b) => Buffer.compare(Buffer.from(a.key), Buffer.from(b.key)));
	const Upload = open.map(({ key, id, begun }) => ({ Key: key, UploadId: id, Initiated: begun }));
	const tree = { Bucket: bucket, Prefix: prefix, IsTruncated: false, Upload };
	sendXml(exchange, 200, 'ListMultipartUploadsResult', tree);
}
