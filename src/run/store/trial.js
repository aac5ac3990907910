import { mkdtempSync, rmSync } from 'node:fs';
import { Agent } from 'node:http';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Client } from 'minio';
import { afterAll, beforeAll } from 'vitest';
import { startStore } from './index.js';

export const bucket = 'photos';
export const accessKey = 'osiergate';
export const secretKey = 'a secret of the bench';

/**
 * A store of its own for one test file, with a client that knows its keys.
 */
export function trialStore() {
	const dir = mkdtempSync(join(tmpdir(), 'endplay-store-'));
	/** @type {Awaited<ReturnType<typeof startStore>>} */
	let store;
	const start = async () => {
		store = await startStore({ dir, accessKey, secretKey, buckets: [bucket] });
	};
	beforeAll(start);
	afterAll(async () => {
		await store.stop();
		rmSync(dir, { recursive: true, force: true });
	});
	return {
		dir,
		/** @param {Partial<import('minio').ClientOptions>} [other] */
		client: (other = {}) =>
			new Client({
				endPoint: '127.0.0.1',
				port: store.port,
				useSSL: false,
				accessKey,
				secretKey,
				region: 'us-east-1',
				// A kept connection would not outlive a restart of the store.
				transportAgent: new Agent(),
				...other
			}),
		host: () => `127.0.0.1:${store.port}`,
		/** @param {string} path @param {RequestInit} [init] */
		fetch: (path, init) => fetch(`${store.endpoint}${path}`, init),
		restart: async () => {
			await store.stop();
			await start();
		}
	};
}

/** @param {NodeJS.ReadableStream} stream @returns {Promise<Buffer>} */
export async function bytesOf(stream) {
	const chunks = [];
	for await (const chunk of stream) chunks.push(Buffer.from(chunk));
	return Buffer.concat(chunks);
}

/**
 * @template T
 * @param {import('node:stream').Readable} stream
 * @returns {Promise<T[]>}
 */
export async function itemsOf(stream) {
	/** @type {T[]} */
	const items = [];
	for await (const item of stream) items.push(item);
	return items;
}
