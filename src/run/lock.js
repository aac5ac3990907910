import { createHash } from 'node:crypto';
import { createServer } from 'node:net';
import { setTimeout as wait } from 'node:timers/promises';

/**
 * A lock that the kernel gives back when the process dies, however it dies: a socket in Linux's
 * abstract name space, so that no file is left behind.
 * @param {string} name
 * @returns {Promise<(() => Promise<void>) | null>} the way to give it back, or null when it is held
 */
export function tryLock(name) {
	const id = createHash('sha256').update(name).digest('hex').slice(0, 32);
	return new Promise((resolve, reject) => {
		const holder = createServer();
		holder.once('error', (error) => {
			if (/** @type {NodeJS.ErrnoException} */ (error).code === 'EADDRINUSE') resolve(null);
			else reject(error);
		});
		holder.listen(`\0endplay-${id}`, () => {
			holder.unref();
			resolve(() => new Promise((done) => holder.close(() => done())));
		});
	});
}

/**
 * @template T
 * @param {string} name
 * @param {() => Promise<T>} work
 * @returns {Promise<T>}
 */
export async function locked(name, work) {
	let release = await tryLock(name);
	while (!release) {
		await wait(40 + Math.random() * 40);
		release = await tryLock(name);
	}
	try {
		return await work();
	} finally {
		await release();
	}
}
