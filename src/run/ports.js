import { createServer } from 'node:net';
import { readIfThere, writeWhole } from './files.js';

/**
 * @param {number} port
 * @param {string} [host]
 * @returns {Promise<boolean>}
 */
export function isFree(port, host = '127.0.0.1') {
	return new Promise((resolve) => {
		const probe = createServer();
		probe.once('error', () => resolve(false));
		probe.listen(port, host, () => probe.close(() => resolve(true)));
	});
}

/**
 * @param {string} [host]
 * @returns {Promise<number>}
 */
export function freePort(host = '127.0.0.1') {
	return new Promise((resolve, reject) => {
		const probe = createServer();
		probe.once('error', reject);
		probe.listen(0, host, () => {
			const address = probe.address();
			const port = address && typeof address === 'object' ? address.port : 0;
			probe.close(() => resolve(port));
		});
	});
}

/**
 * The port of last time, so that addresses stay the same; another one when it is taken.
 * @param {string} file
 * @returns {Promise<number>}
 */
export async function rememberedPort(file) {
	const last = Number(readIfThere(file));
	const port =
		Number.isInteger(last) && last > 0 && last < 65536 && (await isFree(last))
			? last
			: await freePort();
	if (port !== last) writeWhole(file, `${port}\n`);
	return port;
}

/**
 * Starts a server on its remembered port; tries the next one when another program was quicker.
 * @param {import('node:net').Server} server
 * @param {string} file
 * @returns {Promise<number>}
 */
export async function listenRemembered(server, file) {
	for (let attempt = 0; ; attempt++) {
		const port = await rememberedPort(file);
		try {
			await new Promise((resolve, reject) => {
				server.once('error', reject);
				server.listen(port, '127.0.0.1', () => {
					server.off('error', reject);
					resolve(undefined);
				});
			});
			return port;
		} catch (error) {
			if (attempt === 4) throw error;
		}
	}
}
