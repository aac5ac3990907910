import { randomBytes } from 'node:crypto';
import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { readIfThere, writeWhole } from './files.js';
import { locked } from './lock.js';

/**
 * @typedef {object} Secrets
 * @property {string} authSecret
 * @property {string} ownerPassword
 * @property {string} appPassword
 * @property {string} workerPassword
 * @property {string} s3AccessKey
 * @property {string} s3SecretKey
 */

const secret = (bytes = 24) => randomBytes(bytes).toString('base64url');

/**
 * The secrets of this data folder, made once and readable by nobody else.
 * @param {string} dataDir
 * @returns {Promise<Secrets>}
 */
export function readSecrets(dataDir) {
	mkdirSync(dataDir, { recursive: true });
	const file = join(dataDir, 'secrets.json');
	return locked(`secrets:${file}`, async () => {
		const kept = readIfThere(file);
		const known = kept ? /** @type {Partial<Secrets>} */ (JSON.parse(kept)) : {};
		/** @type {Secrets} */
		const all = {
			authSecret: secret(32),
			ownerPassword: secret(),
			appPassword: secret(),
			workerPassword: secret(),
			s3AccessKey: `endplay${randomBytes(6).toString('hex')}`,
			s3SecretKey: secret(30),
			...known
		};
		if (Object.keys(known).length < Object.keys(all).length) {
			writeWhole(file, `${JSON.stringify(all, null, '\t')}\n`, 0o600);
		}
		return all;
	});
}
