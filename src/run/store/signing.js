import { createHash, createHmac, timingSafeEqual } from 'node:crypto';
import { S3Error, badRequest, denied } from './xml.js';

/** @typedef {{ accessKey: string, secretKey: string }} Keys */

/** @param {string | Buffer} key @param {string} text */
const hmac = (key, text) => createHmac('sha256', key).update(text).digest();

/**
 * @param {Keys} keys
 * @param {string} credential access key / day / region / s3 / aws4_request
 * @param {string} date
 * @param {string} hashed
 */
export function sign(keys, credential, date, hashed) {
	const scope = checkCredential(keys, credential);
	if (!date.startsWith(`${scope.split('/')[0]}T`)) throw denied('The dates differ.');
	const text = ['AWS4-HMAC-SHA256', date, scope, hashed].join('\n');
	return signText(keys, scope, text);
}

/** @param {Keys} keys @param {string} credential @returns {string} its scope */
export function checkCredential(keys, credential) {
	const [accessKey, ...scope] = credential.split('/');
	if (scope.length !== 4 || scope[2] !== 's3' || scope[3] !== 'aws4_request') {
		throw badRequest('AuthorizationHeaderMalformed', 'The credential is malformed.');
	}
	if (accessKey !== keys.accessKey) {
		throw new S3Error(403, 'InvalidAccessKeyId', 'The access key is not known here.');
	}
	return scope.join('/');
}

/** @param {Keys} keys @param {string} scope @param {string} text */
export function signText(keys, scope, text) {
	/** @type {string | Buffer} */
	let key = `AWS4${keys.secretKey}`;
	for (const part of scope.split('/')) key = hmac(key, part);
	return hmac(key, text).toString('hex');
}

/** @param {string} given @param {string} expected */
export function compare(given, expected) {
	const [a, b] = [Buffer.from(given), Buffer.from(expected)];
	if (a.length === b.length && timingSafeEqual(a, b)) return;
	throw new S3Error(403, 'SignatureDoesNotMatch', 'The signature does not match.');
}

/** @param {string} text */
export const digest = (text) => createHash('sha256').update(text).digest('hex');

/** @param {string} date such as 20261201T120000Z */
export function readDate(date) {
	const iso = date.replace(/^(\d{4})(\d\d)(\d\d)T(\d\d)(\d\d)(\d\d)Z$/, '$1-$2-$3T$4:$5:$6Z');
	const time = Date.parse(iso);
	if (iso === date || Number.isNaN(time)) throw denied('The date of the signature is malformed.');
	return time;
}
