import { createHash } from 'node:crypto';
import { mkdirSync, readFileSync, readdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { writeWhole } from '../files.js';
import { Blobs } from './blobs.js';

/**
 * @typedef {object} Entry
 * @property {string} key
 * @property {string} blob the name of the file that has the bytes
 * @property {number} size
 * @property {string} etag
 * @property {string} modified ISO time
 * @property {Record<string, string>} headers content type and own metadata, as sent back
 */

/**
 * Objects on disk. The bytes lie under a fresh name, then one small file per key points at them and is
 * renamed into place: a key has the old object or the new one, never half. No key is ever a file name.
 */
export class Disk {
	/** @type {Map<string, Map<string, Entry>>} */
	buckets = new Map();
	/** @type {Map<string, string[]>} the keys in order, until one comes or goes */
	#sorted = new Map();

	/** @param {string} dir */
	constructor(dir) {
		this.dir = dir;
		this.blobs = new Blobs(join(dir, 'blobs'));
		mkdirSync(join(dir, 'buckets'), { recursive: true });
		for (const name of readdirSync(join(dir, 'buckets'))) this.buckets.set(name, this.#load(name));
		const all = [...this.buckets.values()].flatMap((entries) => [...entries.values()]);
		this.blobs.keepOnly(new Set(all.map((entry) => entry.blob)));
	}

	/** @param {string} bucket */
	#load(bucket) {
		/** @type {Map<string, Entry>} */
		const entries = new Map();
		const folder = join(this.dir, 'buckets', bucket);
		for (const name of readdirSync(folder)) {
			if (!name.endsWith('.json')) {
				rmSync(join(folder, name), { force: true });
				continue;
			}
			const entry = /** @type {Entry} */ (JSON.parse(readFileSync(join(folder, name), 'utf8')));
			entries.set(entry.key, entry);
		}
		return entries;
	}

	/** @param {string} bucket */
	makeBucket(bucket) {
		mkdirSync(join(this.dir, 'buckets', bucket), { recursive: true });
		if (!this.buckets.has(bucket)) this.buckets.set(bucket, new Map());
	}

	/** @param {string} bucket */
	removeBucket(bucket) {
		rmSync(join(this.dir, 'buckets', bucket), { recursive: true, force: true });
		this.buckets.delete(bucket);
		this.#sorted.delete(bucket);
	}

	/** @param {string} bucket @param {Entry} entry */
	put(bucket, entry) {
		const entries = this.buckets.get(bucket);
		if (!entries) throw new Error(`No bucket ${bucket}`);
		writeWhole(this.#pointer(bucket, entry.key), JSON.stringify(entry));
		const before = entries.get(entry.key);
		entries.set(entry.key, entry);
		if (before) this.blobs.drop(before.blob);
		else this.#sorted.delete(bucket);
	}

	/** @param {string} bucket @param {string} key */
	remove(bucket, key) {
		const entry = this.buckets.get(bucket)?.get(key);
		if (!entry) return;
		rmSync(this.#pointer(bucket, key), { force: true });
		this.buckets.get(bucket)?.delete(key);
		this.#sorted.delete(bucket);
		this.blobs.drop(entry.blob);
	}

	/** @param {string} bucket @returns {string[]} in the order of their bytes */
	keys(bucket) {
		const known = this.#sorted.get(bucket);
		if (known) return known;
		const made = [...(this.buckets.get(bucket)?.keys() ?? [])]
			.map((key) => Buffer.from(key))
			.sort(Buffer.compare)
			.map((bytes) => bytes.toString());
		this.#sorted.set(bucket, made);
		return made;
	}

	/** @param {string} bucket @param {string} key */
	#pointer(bucket, key) {
		const name = createHash('sha256').update(key).digest('hex');
		return join(this.dir, 'buckets', bucket, `${name}.json`);
	}
}
