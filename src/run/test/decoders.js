import { installPackage } from '../apt.js';
import { onPath } from '../processes.js';
import { Stop, step } from '../say.js';

const DECODERS = [
	{ program: 'pdftoppm', name: 'poppler-utils', what: 'The program that draws PDF pages' },
	{ program: 'zbarimg', name: 'zbar-tools', what: 'The program that reads codes in pictures' }
];

/** What the tests read printed labels with, installed from Debian when it is missing: none of it is our own. */
export async function ensureDecoders() {
	for (const { program, name, what } of DECODERS) {
		if (onPath(program)) continue;
		await step(`installing ${name} from Debian`, () => installPackage(name, what));
		if (!onPath(program)) throw new Stop(`${what} is not to be had from this Debian.`);
	}
}
