/** @typedef {import('./settings.js').Env} Env */

/** @param {Env} env @param {string[]} faults */
export function readPort(env, faults) {
	const text = env.PORT || '3000';
	const port = Number(text);
	if (/^\d+$/.test(text) && port >= 1 && port <= 65535) return port;
	faults.push(`PORT is "${text}". Give a whole number from 1 to 65535.`);
	return 3000;
}

/** @param {string} text @param {string[]} faults */
export function readOrigin(text, faults) {
	const url = URL.canParse(text) ? new URL(text) : null;
	if (url && ['http:', 'https:'].includes(url.protocol)) {
		if (url.pathname === '/' && !url.search && !url.hash) return url.origin;
		faults.push(`ORIGIN is "${text}". Give the address without a path, such as ${url.origin}.`);
	} else {
		faults.push(`ORIGIN is "${text}". Give an address that starts with http:// or https://.`);
	}
	return text;
}

/** @param {Env} env @param {string[]} faults */
export function readDemo(env, faults) {
	const text = env.ENDPLAY_DEMO || '1';
	if (text !== '0' && text !== '1') {
		faults.push(`ENDPLAY_DEMO is "${text}". Give 1 to load the demo shop, 0 for none.`);
	}
	return text !== '0';
}

const databaseNames = /** @type {const} */ ([
	'DATABASE_URL',
	'DATABASE_ADMIN_URL',
	'DATABASE_WORKER_URL'
]);

/** @param {Env} env @param {string[]} faults */
export function readDatabase(env, faults) {
	if (databaseNames.every((name) => !env[name])) return null;
	const [app, admin, worker] = databaseNames.map((name) => {
		if (!env[name]) faults.push(`${name} is missing. ${purpose[name]}`);
		return readUrl(env, name, ['postgres:', 'postgresql:'], faults) ?? '';
	});
	return { app: app ?? '', admin: admin ?? '', worker: worker ?? '' };
}

const purpose = {
	DATABASE_URL: 'Give the address the app uses, as role endplay_app.',
	DATABASE_ADMIN_URL: 'Give the address for migrations, as role endplay_owner.',
	DATABASE_WORKER_URL: 'Give the address for background work, as role endplay_worker.'
};

/** @param {Env} env @param {string[]} faults */
export function readStore(env, faults) {
	const names = ['S3_ENDPOINT', 'S3_ACCESS_KEY', 'S3_SECRET_KEY'];
	if (names.every((name) => !env[name])) return null;
	for (const name of names) {
		if (!env[name]) faults.push(`${name} is missing. A photo store has an address and two keys.`);
	}
	const endpoint = readUrl(env, 'S3_ENDPOINT', ['http:', 'https:'], faults) ?? '';
	return { endpoint, accessKey: env.S3_ACCESS_KEY ?? '', secretKey: env.S3_SECRET_KEY ?? '' };
}

/** @param {Env} env @param {string[]} faults */
export function readBucket(env, faults) {
	const bucket = env.S3_BUCKET || 'endplay';
	if (!/^[a-z0-9][a-z0-9.-]{1,61}[a-z0-9]$/.test(bucket)) {
		faults.push(`S3_BUCKET is "${bucket}". Give 3 to 63 small letters, figures, dots or dashes.`);
	}
	return bucket;
}

/** @param {Env} env @param {string[]} faults */
export function readSender(env, faults) {
	const sender = env.MAIL_FROM || 'Endplay <post@endplay.example>';
	if (!/^([^<>]*<[^<>\s@]+@[^<>\s@]+>|[^<>\s@]+@[^<>\s@]+)$/.test(sender)) {
		faults.push(`MAIL_FROM is "${sender}". Give an e-mail address, or Name <address>.`);
	}
	return sender;
}

/** @param {Env} env @param {string[]} faults */
export function readAuthSecret(env, faults) {
	const text = env.AUTH_SECRET || null;
	if (text && text.length < 32) faults.push('AUTH_SECRET is short. Give 32 characters or more.');
	return text;
}

/** @param {Env} env @param {string} name @param {string[]} protocols @param {string[]} faults */
export function readUrl(env, name, protocols, faults) {
	const text = env[name];
	if (!text) return null;
	if (URL.canParse(text) && protocols.includes(new URL(text).protocol)) return text;
	const starts = protocols.map((protocol) => `${protocol}//`).join(' or ');
	faults.push(`${name} is not an address. Give one that starts with ${starts}.`);
	return null;
}
