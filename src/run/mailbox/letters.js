import { randomBytes } from 'node:crypto';
import { mkdirSync, readFileSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { simpleParser } from 'mailparser';
import { writeWhole } from '../files.js';

/**
 * @typedef {object} Letter
 * @property {string} id
 * @property {string[]} to whom it was handed over for
 * @property {string} from
 * @property {string} subject
 * @property {string} date ISO time of arrival
 * @property {string} text
 * @property {string} html
 * @property {string[]} links in the text, or in the HTML part when there is no text
 * @property {{ name: string, value: string }[]} headers
 */

const address = /https?:\/\/[^\s<>"')\]]*[^\s<>"')\].,;:!?]/g;

/** Letters as .eml files in one folder. */
export class Letters {
	/** @type {Map<string, Letter>} */
	#read = new Map();

	/** @param {string} dir */
	constructor(dir) {
		this.dir = dir;
		mkdirSync(dir, { recursive: true });
	}

	/** @param {Buffer} raw @param {string[]} to */
	keep(raw, to) {
		const time = new Date().toISOString().replace(/[:.]/g, '-');
		const received = Buffer.from(to.map((one) => `Delivered-To: ${one}\r\n`).join(''));
		const counted = String(this.#count++).padStart(6, '0');
		const name = `${time}-${counted}-${randomBytes(4).toString('hex')}.eml`;
		writeWhole(join(this.dir, name), Buffer.concat([received, raw]), 0o600);
	}

	#count = 0;

	/** @param {string} [to] @returns {Promise<Letter[]>} newest first */
	async list(to) {
		const names = readdirSync(this.dir).filter((name) => name.endsWith('.eml'));
		const letters = await Promise.all(
			names
				.sort()
				.reverse()
				.map((name) => this.#load(name))
		);
		const wanted = to?.toLowerCase();
		return letters.filter((one) => !wanted || one.to.some((who) => who.toLowerCase() === wanted));
	}

	/** @param {string} id */
	async get(id) {
		return (await this.list()).find((letter) => letter.id === id) ?? null;
	}

	/** @param {string} name @returns {Promise<Letter>} */
	async #load(name) {
		const known = this.#read.get(name);
		if (known) return known;
		const parsed = await simpleParser(readFileSync(join(this.dir, name)), { skipTextToHtml: true });
		const html = parsed.html || '';
		const source = parsed.text || html.replaceAll('&amp;', '&');
		const headers = parsed.headerLines.map(({ key, line }) => ({
			name: key,
			value: line.slice(line.indexOf(':') + 1).trim()
		}));
		const letter = {
			id: name.replace(/\.eml$/, ''),
			to: headers.filter((one) => one.name === 'delivered-to').map((one) => one.value),
			from: parsed.from?.text ?? '',
			subject: parsed.subject ?? '',
			date: name.replace(/^(.{10}T\d\d)-(\d\d)-(\d\d)-(\d{3}Z).*$/, '$1:$2:$3.$4'),
			text: parsed.text ?? '',
			html,
			links: [...new Set(source.match(address) ?? [])],
			headers
		};
		this.#read.set(name, letter);
		return letter;
	}
}
