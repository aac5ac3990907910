import { createHash, randomUUID } from 'node:crypto';
import { createWriteStream, mkdirSync, readdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { Transform } from 'node:stream';
import { pipeline } from 'node:stream/promises';

/** @typedef {{ blob: string, size: number, md5: string, sha256: string }} Written */
/** @typedef {AsyncIterable<Buffer> | NodeJS.ReadableStream | Buffer[]} Source */

/** The bytes of objects, each under a fresh name. */
export class Blobs {
	/** @param {string} dir */
	constructor(dir) {
		this.dir = dir;
		mkdirSync(dir, { recursive: true });
	}

	/** @param {string} blob */
	path(blob) {
		return join(this.dir, blob);
	}

	/** @param {string} blob */
	drop(blob) {
		rmSync(this.path(blob), { force: true });
	}

	/**
	 * Removes what a crash left behind: bytes that no key points at.
	 * @param {Set<string>} used
	 */
	keepOnly(used) {
		for (const name of readdirSync(this.dir)) if (!used.has(name)) this.drop(name);
	}

	/** @param {Source} source @returns {Promise<Written>} */
	async write(source) {
		const blob = randomUUID();
		return { blob, ...(await writeMeasured(source, this.path(blob))) };
	}
}

/**
 * Writes to disk, counting and hashing on the way; leaves nothing when it fails.
 * @param {Source} source
 * @param {string} path
 */
export async function writeMeasured(source, path) {
	const md5 = createHash('md5');
	const sha256 = createHash('sha256');
	let size = 0;
	const measure = new Transform({
		transform(chunk, _encoding, done) {
			md5.update(chunk);
			sha256.update(chunk);
			size += chunk.length;
			done(null, chunk);
		}
	});
	try {
		await pipeline(source, measure, createWriteStream(path, { flush: true }));
	} catch (error) {
		rmSync(path, { force: true });
		throw error;
	}
	return { size, md5: md5.digest('hex'), sha256: sha256.digest('hex') };
}
