import { mkdirSync } from 'node:fs';
import { ensureBuild } from './build.js';
import { prepareDatabase } from './database.js';
import { tryLock } from './lock.js';
import { ensurePackages } from './packages.js';
import { isFree } from './ports.js';
import { Stop, inWords, step } from './say.js';
import { seed } from './seed.js';
import { startServer } from './server.js';
import { startServices } from './services.js';
import { settingsOrExit } from './settings.js';
import { Stopping } from './stopping.js';

const began = performance.now();
const reload = process.argv.includes('--reload');
const settings = settingsOrExit();
const stopping = new Stopping();
/** @type {import('./server.js').Server | null} */
let server = null;

stopping.onSignals(() => void server?.stop(true));

try {
	server = await start();
	const code = await server.ended;
	if (!stopping.begun) {
		console.error(`The server ended (${code}).`);
		await stopping.stop();
		process.exit(code || 1);
	}
} catch (error) {
	if (stopping.begun) await stopping.stop();
	else console.error(`\n${inWords(error)}`);
	await stopping.stop();
	process.exit(1);
}

async function start() {
	console.log('Endplay is starting.');
	await checkPlace();
	await ensurePackages();
	const services = await startServices({ dataDir: settings.dataDir, settings, stopping });
	const database = await prepareDatabase(services, settings.database);
	const env = { ...serverEnv(), ...services.env, ...database };
	if (settings.demo) await step('loading the demo shop if the database is empty', () => seed(env));
	if (!reload) await ensureBuild(settings.dataDir);
	if (stopping.begun) throw new Stop('Stopped.');
	const { port } = settings;
	const running = await step('starting the server', () =>
		startServer({ env, port, reload, stopping })
	);
	greet(services.mailboxUrl);
	return running;
}

async function checkPlace() {
	const { dataDir, port, host } = settings;
	mkdirSync(dataDir, { recursive: true });
	if (!(await tryLock(`start:${dataDir}`))) {
		throw new Stop(
			`Endplay is already running with the data in ${dataDir}. Stop it first, or choose another folder with ENDPLAY_DATA.`
		);
	}
	if (!(await isFree(port, host))) {
		throw new Stop(
			`Port ${port} is taken by another program. Stop that one, or choose another port: PORT=${port + 1} npm start`
		);
	}
}

function serverEnv() {
	return {
		PORT: `${settings.port}`,
		HOST: settings.host,
		ORIGIN: settings.origin,
		BODY_SIZE_LIMIT: '30M',
		SHUTDOWN_TIMEOUT: '3'
	};
}

/** @param {string | null} mailboxUrl */
function greet(mailboxUrl) {
	const seconds = ((performance.now() - began) / 1000).toFixed(1);
	console.log(`\nEndplay is ready after ${seconds} s: ${settings.origin}`);
	if (mailboxUrl) console.log(`The letters it sends are kept here: ${mailboxUrl}`);
	if (settings.demo) {
		console.log('\nDemo sign-ins, all with the password "endplay demo shop":');
		for (const name of ['owner', 'bench', 'counter', 'reader']) {
			console.log(`  ${name}@osiergate.example`);
		}
		console.log('  owner@thrennick.example (a second, small shop)');
	}
	console.log('\nCtrl-C stops it.');
}
