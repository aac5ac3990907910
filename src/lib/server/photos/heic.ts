import { createRequire } from 'node:module';
import { Worker } from 'node:worker_threads';
import { turns } from './turns';

export interface RawPicture {
	width: number;
	height: number;
	/** Red, green, blue and alpha of each point. */
	data: Uint8Array;
}

const PATIENCE_MS = 10_000;

// Kept as text: a thread starts from a file, and the build gathers our own into a few of other names.
const THREAD = `
const { parentPort, workerData } = require('node:worker_threads');
require(workerData.decoder)({ buffer: workerData.bytes }).then(({ width, height, data }) =>
	parentPort.postMessage({ width, height, data }, [data.buffer])
);`;

const decoder = createRequire(import.meta.url).resolve('heic-decode');

/** One at a time, each in a thread that ends with it: what its decoder held is given back. */
const turn = turns(1);

/** The points of a HEIC picture, upright. Decoding takes a second or more, so it keeps out of everybody's way. */
export const decodeHeic = (bytes: Buffer): Promise<RawPicture> =>
	turn(
		() =>
			new Promise((done, fail) => {
				const thread = new Worker(THREAD, {
					eval: true,
					execArgv: [],
					env: {},
					workerData: { decoder, bytes }
				});
				const late = setTimeout(() => void thread.terminate(), PATIENCE_MS);
				thread.once('message', done);
				thread.once('error', fail);
				thread.once('exit', () => {
					clearTimeout(late);
					fail(new Error('The HEIC decoder ended without a picture'));
				});
			})
	);
