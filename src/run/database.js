import { step } from './say.js';

/**
 * Roles, database and tables, as far as they are ours to make.
 * @param {import('./services.js').Services} services
 * @param {import('./settings.js').Settings['database']} given
 * @param {string} [name] of our own database
 * @returns {Promise<Record<string, string>>} how the app reaches it
 */
export async function prepareDatabase({ adminUrl, secrets }, given, name = 'endplay') {
	const { ensureDatabase, ensureRoles } = await import('./roles.js');
	const { migrate } = await import('./migrate.js');
	if (given) {
		await step('migrating', () => migrate({ owner: given.admin, worker: given.worker }));
		return { DATABASE_URL: given.app, DATABASE_WORKER_URL: given.worker };
	}
	if (!adminUrl) throw new Error('Neither a database given nor one of our own');
	const urls = await step('migrating', async () => {
		await ensureRoles(adminUrl, secrets);
		const made = await ensureDatabase(adminUrl, name, secrets);
		await migrate(made);
		return made;
	});
	return { DATABASE_URL: urls.app, DATABASE_WORKER_URL: urls.worker };
}
