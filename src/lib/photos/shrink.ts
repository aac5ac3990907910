import type { Asked, Told } from './shrink.worker';

interface Waiting {
	onThumb: (thumb: Blob) => void;
	done: (body: Blob | null) => void;
}

/** A photo with so many points may take a slow phone a while; after that the file goes as it is. */
const PATIENCE_MS = 60_000;

let worker: Worker | null | undefined;
let last = 0;
const waiting = new Map<number, Waiting>();

/** The worker is gone or cannot start: what waits for it goes as it is. */
function giveUp(): void {
	worker?.terminate();
	worker = null;
	for (const { done } of waiting.values()) done(null);
	waiting.clear();
}

function start(): Worker | null {
	if (typeof Worker === 'undefined' || typeof OffscreenCanvas === 'undefined') return null;
	const made = new Worker(new URL('./shrink.worker.ts', import.meta.url), { type: 'module' });
	made.onerror = giveUp;
	made.onmessage = ({ data }: MessageEvent<Told>) => {
		const one = waiting.get(data.id);
		if ('thumb' in data) one?.onThumb(data.thumb);
		else {
			waiting.delete(data.id);
			one?.done(data.body);
		}
	};
	return made;
}

/** Has the worker ready before the first photo is there. */
export const warmShrink = (): void => {
	if (worker === undefined) worker = start();
};

/**
 * Makes a photo as small as it needs to be, upright, beside the page's own work; `onThumb` hears of a small
 * picture first. Null where the file itself is to be sent: it is small already, `whole` is asked for, or
 * this browser cannot read it.
 */
export function shrinkPhoto(
	file: Blob,
	whole: boolean,
	onThumb: (thumb: Blob) => void
): Promise<Blob | null> {
	warmShrink();
	const thread = worker;
	if (!thread) return Promise.resolve(null);
	const id = ++last;
	const late = setTimeout(giveUp, PATIENCE_MS);
	return new Promise<Blob | null>((done) => {
		waiting.set(id, { onThumb, done });
		thread.postMessage({ id, file, whole } satisfies Asked);
	}).finally(() => clearTimeout(late));
}

export type Shrink = typeof shrinkPhoto;
