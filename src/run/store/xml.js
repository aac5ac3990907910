/** A refusal as S3 words it: status, code, message. */
export class S3Error extends Error {
	/** @param {number} status @param {string} code @param {string} message */
	constructor(status, code, message) {
		super(message);
		this.status = status;
		this.code = code;
	}
}

export const denied = (message = 'Access Denied') => new S3Error(403, 'AccessDenied', message);
export const badRequest = (/** @type {string} */ code, /** @type {string} */ message) =>
	new S3Error(400, code, message);

/** @param {unknown} value */
export function escape(value) {
	// A carriage return that is not escaped would reach the reader as a line feed.
	return String(value)
		.replace(/&/g, '&amp;')
		.replace(/</g, '&lt;')
		.replace(/>/g, '&gt;')
		.replace(/"/g, '&quot;')
		.replace(/\r/g, '&#13;');
}

/** @param {string} text */
function unescape(text) {
	return text
		.replace(/&#x([0-9a-f]+);/gi, (_, hex) => String.fromCodePoint(parseInt(hex, 16)))
		.replace(/&#(\d+);/g, (_, number) => String.fromCodePoint(Number(number)))
		.replace(/&lt;/g, '<')
		.replace(/&gt;/g, '>')
		.replace(/&quot;/g, '"')
		.replace(/&apos;/g, "'")
		.replace(/&amp;/g, '&');
}

/** @typedef {{ [name: string]: XmlValue | XmlValue[] }} XmlTree */
/** @typedef {string | number | boolean | XmlTree | undefined} XmlValue */

/**
 * @param {string} name
 * @param {XmlValue | XmlValue[]} value an array becomes the same element several times
 * @returns {string}
 */
export function element(name, value) {
	if (value === undefined) return '';
	if (Array.isArray(value)) return value.map((one) => element(name, one)).join('');
	if (typeof value !== 'object') return `<${name}>${escape(value)}</${name}>`;
	const inside = Object.entries(value).map(([child, of]) => element(child, of));
	return `<${name}>${inside.join('')}</${name}>`;
}

/** @param {string} name @param {XmlTree} value */
export function document(name, value) {
	const inside = Object.entries(value).map(([child, of]) => element(child, of));
	return `<?xml version="1.0" encoding="UTF-8"?>\n<${name} xmlns="http://s3.amazonaws.com/doc/2006-03-01/">${inside.join('')}</${name}>`;
}

/**
 * The texts of all elements of that name, in the order they stand in.
 * @param {string} xml
 * @param {string} name
 * @returns {string[]}
 */
export function texts(xml, name) {
	return blocks(xml, name).map(unescape);
}

/** @param {string} xml @param {string} name @returns {string[]} their insides, still escaped */
export function blocks(xml, name) {
	const pattern = new RegExp(`<${name}(?:\\s[^>]*)?>([\\s\\S]*?)</${name}>`, 'g');
	return [...xml.matchAll(pattern)].map((match) => match[1] ?? '');
}
