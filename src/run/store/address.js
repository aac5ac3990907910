import { badRequest } from './xml.js';

/**
 * What a request asks for. Read by hand: the URL class would fold "a/../b", which is a key like any other.
 * @typedef {object} Address
 * @property {string} path decoded
 * @property {string} bucket
 * @property {string} key
 * @property {[string, string][]} pairs the query, where '+' stays a plus sign
 * @property {Map<string, string>} query
 */

/** @param {string} target @returns {Address} */
export function readAddress(target) {
	const mark = target.indexOf('?');
	const path = decode(mark < 0 ? target : target.slice(0, mark));
	const search = mark < 0 ? '' : target.slice(mark + 1);
	const slash = path.indexOf('/', 1);
	const pairs = search.split('&').filter(Boolean).map(readPair);
	return {
		path,
		bucket: slash < 0 ? path.slice(1) : path.slice(1, slash),
		key: slash < 0 ? '' : path.slice(slash + 1),
		pairs,
		query: new Map(pairs)
	};
}

/** @param {string} part @returns {[string, string]} */
function readPair(part) {
	const at = part.indexOf('=');
	return at < 0 ? [decode(part), ''] : [decode(part.slice(0, at)), decode(part.slice(at + 1))];
}

/** @param {string} text */
export function decode(text) {
	try {
		return decodeURIComponent(text);
	} catch {
		throw badRequest('InvalidURI', 'The address could not be read.');
	}
}

/** @param {string} text @returns {string} as the signature has it: all but letters, figures and -._~ */
export function encode(text) {
	return encodeURIComponent(text).replace(
		/[!'()*]/g,
		(sign) => `%${sign.charCodeAt(0).toString(16).toUpperCase()}`
	);
}
