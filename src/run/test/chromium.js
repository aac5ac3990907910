import { installPackage } from '../apt.js';
import { onPath } from '../processes.js';
import { Stop, step } from '../say.js';

/** @returns {Promise<string>} the path of Chromium, installed from Debian when it is missing */
export async function ensureChromium() {
	const given = process.env.CHROMIUM_PATH ?? onPath('chromium');
	if (given) return given;
	await step('installing Chromium from Debian', () => installPackage('chromium', 'Chromium'));
	const installed = onPath('chromium');
	if (!installed) throw new Stop('Chromium is not to be had from this Debian.');
	return installed;
}
