import { randomBytes } from 'node:crypto';
import {
	createReadStream,
	existsSync,
	mkdirSync,
	readFileSync,
	readdirSync,
	rmSync
} from 'node:fs';
import { join } from 'node:path';
import { writeWhole } from '../files.js';
import { writeMeasured } from './blobs.js';
import { S3Error } from './xml.js';

/**
 * @typedef {object} Upload
 * @property {string} id
 * @property {string} bucket
 * @property {string} key
 * @property {string} begun ISO time
 * @property {Record<string, string>} headers
 */

/** @typedef {{ number: number, size: number, md5: string, modified: string }} Part */

const tooOld = 24 * 3600 * 1000;

/** Uploads in parts that are not finished: a folder each, with a file for every part. */
export class Uploads {
	/** @param {string} dir */
	constructor(dir) {
		this.dir = dir;
		mkdirSync(dir, { recursive: true });
		for (const upload of this.all()) {
			if (Date.now() - Date.parse(upload.begun) > tooOld) this.drop(upload);
		}
	}

	/** @param {Omit<Upload, 'id' | 'begun'>} of @returns {Upload} */
	begin(of) {
		const upload = { ...of, id: randomBytes(16).toString('hex'), begun: new Date().toISOString() };
		mkdirSync(join(this.dir, upload.id));
		writeWhole(join(this.dir, upload.id, 'upload.json'), JSON.stringify(upload));
		return upload;
	}

	/** @param {string} id @param {string} bucket @param {string} key @returns {Upload} */
	get(id, bucket, key) {
		const upload = /^[0-9a-f]{32}$/.test(id) ? this.#read(id) : null;
		if (upload && upload.bucket === bucket && upload.key === key) return upload;
		throw new S3Error(404, 'NoSuchUpload', 'There is no such upload.');
	}

	/** @returns {Upload[]} */
	all() {
		return readdirSync(this.dir).flatMap((id) => this.#read(id) ?? []);
	}

	/** @param {string} id @returns {Upload | null} */
	#read(id) {
		const file = join(this.dir, id, 'upload.json');
		return existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : null;
	}

	/** @param {Upload} upload @param {number} number @param {import('./blobs.js').Source} source @param {(written: { size: number, md5: string, sha256: string }) => void} check */
	async addPart(upload, number, source, check) {
		const folder = join(this.dir, upload.id);
		const bytes = `${number}.${randomBytes(4).toString('hex')}.bytes`;
		const written = await writeMeasured(source, join(folder, bytes));
		try {
			check(written);
			const part = { ...written, number, bytes, modified: new Date().toISOString() };
			writeWhole(join(folder, `${number}.part`), JSON.stringify(part));
		} catch (error) {
			rmSync(join(folder, bytes), { force: true });
			throw error;
		}
		return written;
	}

	/** @param {Upload} upload @returns {(Part & { bytes: string })[]} in order */
	parts(upload) {
		const folder = join(this.dir, upload.id);
		return readdirSync(folder)
			.filter((name) => name.endsWith('.part'))
			.map((name) => JSON.parse(readFileSync(join(folder, name), 'utf8')))
			.sort((a, b) => a.number - b.number);
	}

	/**
	 * The bytes of these parts, one after the other.
	 * @param {Upload} upload
	 * @param {{ bytes: string }[]} parts
	 */
	async *bytes(upload, parts) {
		for (const part of parts) yield* createReadStream(join(this.dir, upload.id, part.bytes));
	}

	/** @param {Upload} upload */
	drop(upload) {
		rmSync(join(this.dir, upload.id), { recursive: true, force: true });
	}
}
