import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { startPostgres } from './postgres/index.js';
import { step } from './say.js';
import { readSecrets } from './secrets.js';
import { startStore } from './store/index.js';

/**
 * @typedef {object} Services
 * @property {Record<string, string>} env how the app reaches the store and the post
 * @property {string | null} adminUrl our own PostgreSQL's superuser, null when one was given
 * @property {import('./secrets.js').Secrets} secrets
 * @property {string | null} mailboxUrl the page of the local mailbox
 */

/**
 * Starts what is not given by address. Each is stoppable the moment it runs.
 * @param {object} options
 * @param {string} options.dataDir
 * @param {Pick<import('./settings.js').Settings, 'database' | 'store' | 'bucket' | 'smtpUrl' | 'mailFrom' | 'authSecret'>} options.settings
 * @param {boolean} [options.fast]
 * @param {import('./stopping.js').Stopping} options.stopping
 * @returns {Promise<Services>}
 */
export async function startServices({ dataDir, settings, fast = false, stopping }) {
	mkdirSync(dataDir, { recursive: true });
	const secrets = await readSecrets(dataDir);
	const adminUrl = settings.database ? null : await ownPostgres(dataDir, fast, stopping);
	const store = settings.store ?? (await ownStore(dataDir, settings.bucket, secrets, stopping));
	const mailbox = settings.smtpUrl ? null : await ownMailbox(dataDir, stopping);
	const env = {
		S3_ENDPOINT: store.endpoint,
		S3_ACCESS_KEY: store.accessKey,
		S3_SECRET_KEY: store.secretKey,
		S3_BUCKET: settings.bucket,
		SMTP_URL: settings.smtpUrl ?? mailbox?.smtpUrl ?? '',
		MAIL_FROM: settings.mailFrom,
		AUTH_SECRET: settings.authSecret ?? secrets.authSecret
	};
	return { env, adminUrl, secrets, mailboxUrl: mailbox?.pageUrl ?? null };
}

/** @param {string} dataDir @param {boolean} fast @param {import('./stopping.js').Stopping} stopping */
async function ownPostgres(dataDir, fast, stopping) {
	const log = (/** @type {string} */ line) => console.log(`  ${line}`);
	const dir = join(dataDir, 'postgres');
	const postgres = await step('starting PostgreSQL', () =>
		stopping.whenUp(startPostgres({ dir, fast, log }))
	);
	return postgres.adminUrl;
}

/** @param {string} dataDir @param {string} bucket @param {import('./secrets.js').Secrets} secrets @param {import('./stopping.js').Stopping} stopping */
async function ownStore(dataDir, bucket, secrets, stopping) {
	const keys = { accessKey: secrets.s3AccessKey, secretKey: secrets.s3SecretKey };
	const options = { dir: join(dataDir, 'store'), buckets: [bucket], ...keys };
	const store = await step('starting the photo store', () => stopping.whenUp(startStore(options)));
	return { endpoint: store.endpoint, ...keys };
}

/** @param {string} dataDir @param {import('./stopping.js').Stopping} stopping */
async function ownMailbox(dataDir, stopping) {
	return step('starting the mailbox', async () => {
		const { startMailbox } = await import('./mailbox/index.js');
		return stopping.whenUp(startMailbox({ dir: join(dataDir, 'mail') }));
	});
}
