import { encode } from './address.js';
import { compare, digest, readDate, sign } from './signing.js';
import { S3Error, badRequest, denied } from './xml.js';

/** @typedef {import('./signing.js').Keys} Keys */
/** @typedef {import('./address.js').Address} Address */
/** @typedef {import('node:http').IncomingMessage} Request */

const quarterHour = 15 * 60 * 1000;
const week = 7 * 24 * 3600;

/**
 * Checks that the request was signed with our secret, in its headers or in its address.
 * @param {Request} request
 * @param {Address} address
 * @param {Keys} keys
 * @returns {string} the sha256 that the body must have, or UNSIGNED-PAYLOAD
 */
export function verify(request, address, keys) {
	const presigned = address.query.has('X-Amz-Signature');
	const { authorization } = request.headers;
	if (presigned && authorization) throw badRequest('InvalidArgument', 'Two signatures given.');
	if (presigned) return verifyQuery(request, address, keys);
	if (authorization) return verifyHeader(request, address, keys, authorization);
	throw denied();
}

/** @param {Request} request @param {Address} address @param {Keys} keys @param {string} authorization */
function verifyHeader(request, address, keys, authorization) {
	const match =
		/^AWS4-HMAC-SHA256 Credential=([^,]+),\s*SignedHeaders=([^,]+),\s*Signature=([0-9a-f]{64})$/.exec(
			authorization
		);
	if (!match) throw badRequest('AuthorizationHeaderMalformed', 'The authorization is malformed.');
	const [, credential = '', signed = '', signature = ''] = match;
	const date = String(request.headers['x-amz-date'] ?? '');
	if (Math.abs(Date.now() - readDate(date)) > quarterHour) {
		throw new S3Error(403, 'RequestTimeTooSkewed', 'The clocks differ by too much.');
	}
	const bodyHash = String(request.headers['x-amz-content-sha256'] ?? '');
	if (!/^([0-9a-f]{64}|UNSIGNED-PAYLOAD)$/.test(bodyHash)) {
		throw new S3Error(501, 'NotImplemented', 'This kind of payload signature is not spoken here.');
	}
	const canonical = canonicalRequest(request, address, address.pairs, signed, bodyHash);
	compare(signature, sign(keys, credential, date, digest(canonical)));
	return bodyHash;
}

/** @param {Request} request @param {Address} address @param {Keys} keys */
function verifyQuery(request, address, keys) {
	const given = address.query;
	const date = given.get('X-Amz-Date') ?? '';
	const seconds = Number(given.get('X-Amz-Expires'));
	if (given.get('X-Amz-Algorithm') !== 'AWS4-HMAC-SHA256' || !(seconds >= 1 && seconds <= week)) {
		throw badRequest('AuthorizationQueryParametersError', 'The signed address is malformed.');
	}
	const rest = address.pairs.filter(([name]) => name !== 'X-Amz-Signature');
	const signed = given.get('X-Amz-SignedHeaders') ?? '';
	const canonical = canonicalRequest(request, address, rest, signed, 'UNSIGNED-PAYLOAD');
	const credential = given.get('X-Amz-Credential') ?? '';
	compare(given.get('X-Amz-Signature') ?? '', sign(keys, credential, date, digest(canonical)));
	const age = Date.now() - readDate(date);
	if (age > seconds * 1000) throw denied('Request has expired');
	if (age < -quarterHour) throw denied('Request is not yet valid');
	return 'UNSIGNED-PAYLOAD';
}

/** @param {Request} request @param {Address} address @param {[string, string][]} pairs @param {string} signed @param {string} bodyHash */
function canonicalRequest(request, address, pairs, signed, bodyHash) {
	const names = signed.split(';');
	const loose = Object.keys(request.headers).find(
		(name) => name.startsWith('x-amz-') && !names.includes(name)
	);
	if (loose || !names.includes('host')) throw denied('A header stands outside the signature.');
	const headers = names.map((name) => {
		const value = request.headers[name] ?? '';
		return `${name}:${String(value).trim().replace(/ +/g, ' ')}\n`;
	});
	const path = address.path.split('/').map(encode).join('/');
	return [request.method, path, canonicalQuery(pairs), headers.join(''), signed, bodyHash].join(
		'\n'
	);
}

/** @param {[string, string][]} pairs */
function canonicalQuery(pairs) {
	return pairs
		.map(([name, value]) => [encode(name), encode(value)])
		.sort(([a = '', x = ''], [b = '', y = '']) => (a === b ? order(x, y) : order(a, b)))
		.map((pair) => pair.join('='))
		.join('&');
}

/** @param {string} a @param {string} b */
const order = (a, b) => (a < b ? -1 : a > b ? 1 : 0);
