import { ensureBuild } from '../build.js';
import { freePort } from '../ports.js';
import { step } from '../say.js';
import { seed } from '../seed.js';
import { startServer } from '../server.js';
import { ensureChromium } from './chromium.js';
import { ensureDecoders } from './decoders.js';
import { dataDir, freshDatabase } from './places.js';
import { journeys } from './stages.js';

/**
 * The journeys through the built app, with the demo loaded, in Chromium.
 * @param {import('./places.js').Place} place
 * @param {import('../stopping.js').Stopping} stopping
 */
export async function e2e(place, stopping) {
	const chromium = await ensureChromium();
	await ensureDecoders();
	await ensureBuild(dataDir);
	const urls = await freshDatabase(place, 'endplay_e2e');
	const port = await freePort();
	const origin = `http://localhost:${port}`;
	const env = {
		...place.app,
		PORT: `${port}`,
		HOST: '127.0.0.1',
		ORIGIN: origin,
		BODY_SIZE_LIMIT: '30M',
		SHUTDOWN_TIMEOUT: '3',
		DATABASE_URL: urls.app,
		DATABASE_WORKER_URL: urls.worker
	};
	await step('loading the demo shop', () => seed(env));
	const server = await startServer({ env, port, quiet: true, stopping });
	try {
		return await journeys({
			...env,
			E2E_BASE_URL: origin,
			MAILBOX_URL: place.mailboxUrl,
			CHROMIUM_PATH: chromium
		});
	} finally {
		await server.stop();
	}
}
