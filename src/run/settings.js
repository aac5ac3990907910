import { resolve } from 'node:path';
import { root } from './files.js';
import {
	readAuthSecret,
	readBucket,
	readDatabase,
	readDemo,
	readOrigin,
	readPort,
	readSender,
	readStore,
	readUrl
} from './settings-read.js';

/**
 * @typedef {object} Settings
 * @property {number} port
 * @property {string} host
 * @property {string} origin
 * @property {string} dataDir
 * @property {boolean} demo
 * @property {{ app: string, admin: string, worker: string } | null} database null: run one here
 * @property {{ endpoint: string, accessKey: string, secretKey: string } | null} store null: run one here
 * @property {string} bucket
 * @property {string | null} smtpUrl null: run a mailbox here
 * @property {string} mailFrom
 * @property {string | null} authSecret null: make one and keep it
 */

/** @typedef {Record<string, string | undefined>} Env */

/**
 * Reads the settings from the environment.
 * @param {Env} env
 * @returns {{ settings: Settings, faults: string[] }} every fault at once, each saying what to do
 */
export function readSettings(env) {
	/** @type {string[]} */
	const faults = [];
	const port = readPort(env, faults);
	const settings = {
		port,
		host: env.HOST || '0.0.0.0',
		origin: readOrigin(env.ORIGIN || `http://localhost:${port}`, faults),
		dataDir: resolve(root, env.ENDPLAY_DATA || '.endplay'),
		demo: readDemo(env, faults),
		database: readDatabase(env, faults),
		store: readStore(env, faults),
		bucket: readBucket(env, faults),
		smtpUrl: readUrl(env, 'SMTP_URL', ['smtp:', 'smtps:'], faults),
		mailFrom: readSender(env, faults),
		authSecret: readAuthSecret(env, faults)
	};
	return { settings, faults };
}

/**
 * Reads the settings of this process; prints the faults and ends when there are any.
 * @returns {Settings}
 */
export function settingsOrExit() {
	const { settings, faults } = readSettings(process.env);
	if (faults.length === 0) return settings;
	console.error('Endplay does not start. Settings to correct:');
	for (const fault of faults) console.error(`  - ${fault}`);
	process.exit(1);
}
