import { entriesOf, ownHeaders, sendEmpty, sendXml } from './exchange.js';
import { checkKey, keep } from './objects.js';
import { checkCredential, compare, signText } from './signing.js';
import { S3Error, badRequest, denied } from './xml.js';

/** @typedef {import('./exchange.js').Exchange} Exchange */
/** @typedef {Map<string, string>} Fields the form's fields, their names in small letters */

// A form is held in memory while it is read.
const largestForm = 100 * 1024 * 1024;
const unlisted = ['policy', 'x-amz-signature', 'file', 'bucket'];

/**
 * An upload by a form, allowed by a policy that we signed.
 * @param {Exchange} exchange
 */
export async function postObject(exchange) {
	const { disk, address, keys } = exchange;
	entriesOf(exchange);
	const { fields, file } = await readForm(exchange.request);
	const key = (fields.get('key') ?? '').replaceAll('${filename}', file.name);
	if (!key) throw badRequest('InvalidArgument', 'The form has no key.');
	checkKey(key);
	const policy = readPolicy(fields, keys);
	checkPolicy(policy, new Map(fields).set('key', key).set('bucket', address.bucket), file.size);
	const written = await disk.blobs.write([Buffer.from(await file.arrayBuffer())]);
	address.key = key;
	const { etag } = keep(exchange, written, ownHeaders(Object.fromEntries(fields)));
	const location = `/${address.bucket}/${key}`;
	if (fields.get('success_action_status') !== '201') {
		sendEmpty(exchange, fields.get('success_action_status') === '200' ? 200 : 204, {
			etag: `"${etag}"`
		});
		return;
	}
	const tree = { Location: location, Bucket: address.bucket, Key: key, ETag: `"${etag}"` };
	sendXml(exchange, 201, 'PostResponse', tree);
}

/** @param {import('node:http').IncomingMessage} request */
async function readForm(request) {
	const chunks = [];
	let size = 0;
	for await (const chunk of request) {
		size += chunk.length;
		if (size > largestForm) throw badRequest('EntityTooLarge', 'The form is too large.');
		chunks.push(chunk);
	}
	const headers = { 'content-type': request.headers['content-type'] ?? '' };
	const form = await new Response(Buffer.concat(chunks), { headers }).formData().catch(() => {
		throw badRequest('MalformedPOSTRequest', 'The form could not be read.');
	});
	/** @type {Fields} */
	const fields = new Map();
	// What stands after the file does not count.
	for (const [name, value] of form.entries()) {
		if (typeof value !== 'string') return { fields, file: value };
		fields.set(name.toLowerCase(), value);
	}
	throw badRequest('InvalidArgument', 'The form has no file.');
}

/** @param {Fields} fields @param {import('./signing.js').Keys} keys */
function readPolicy(fields, keys) {
	const encoded = fields.get('policy');
	if (!encoded || fields.get('x-amz-algorithm') !== 'AWS4-HMAC-SHA256') throw denied();
	const scope = checkCredential(keys, fields.get('x-amz-credential') ?? '');
	compare(fields.get('x-amz-signature') ?? '', signText(keys, scope, encoded));
	try {
		const { expiration, conditions } = JSON.parse(Buffer.from(encoded, 'base64').toString('utf8'));
		return { expiration: Date.parse(expiration), conditions: conditions.flatMap(toRules) };
	} catch {
		throw badRequest('InvalidPolicyDocument', 'The policy could not be read.');
	}
}

/** @typedef {[string, string | number, string | number]} Rule */

/** @param {unknown} condition @returns {Rule[]} */
function toRules(condition) {
	if (Array.isArray(condition)) {
		return [[String(condition[0]).toLowerCase(), condition[1], condition[2]]];
	}
	const pairs = Object.entries(/** @type {Record<string, string>} */ (condition));
	return pairs.map(([name, value]) => ['eq', `$${name}`, value]);
}

/** @param {{ expiration: number, conditions: Rule[] }} policy @param {Fields} fields @param {number} size */
function checkPolicy({ expiration, conditions }, fields, size) {
	if (!(expiration > Date.now())) throw denied('The policy has expired.');
	const named = new Set(unlisted);
	for (const [how, what, value] of conditions) {
		if (how === 'content-length-range') {
			checkSize(size, Number(what), Number(value));
			continue;
		}
		const name = String(what).replace(/^\$/, '').toLowerCase();
		named.add(name);
		const given = fields.get(name) ?? '';
		const holds = how === 'starts-with' ? given.startsWith(String(value)) : given === String(value);
		if (!holds || !['eq', 'starts-with'].includes(how))
			throw denied(`The policy forbids this ${name}.`);
	}
	const extra = [...fields.keys()].find(
		(name) => !named.has(name) && !name.startsWith('x-ignore-')
	);
	if (extra) throw denied(`The policy does not name ${extra}.`);
}

/** @param {number} size @param {number} least @param {number} most */
function checkSize(size, least, most) {
	if (size < least) throw badRequest('EntityTooSmall', 'The file is smaller than allowed.');
	if (!(size <= most)) throw new S3Error(400, 'EntityTooLarge', 'The file is larger than allowed.');
}
