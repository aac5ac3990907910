import { createRequire } from 'node:module';
import { dirname, join } from 'node:path';
import { Worker as Thread } from 'node:worker_threads';
import type { Worker } from 'tesseract.js';
import { within } from './time-limit';
import { turns } from './turns';

/** A word as the reader hands it over, in pixels of the picture it was given. */
export interface ReadWord {
	text: string;
	/** How sure each character is, 0 to 1. */
	sure: number[];
	box: { x0: number; y0: number; x1: number; y1: number };
	/** How the line it stands on runs, in degrees clockwise. */
	slope: number;
}

/** Words scattered over a picture, or lines of one block. */
export type Layout = 'scattered' | 'block';
/** What it tells itself about a picture is nobody's business. */
const QUIET = { user_defined_dpi: '300', debug_file: '/dev/null' };
const LAYOUT = { scattered: '11', block: '6' } as const;

const IDLE_MS = 60_000;
const LIMIT_MS = 20_000;

/** One at a time: a reader takes a whole processor and some 150 megabytes. */
const turn = turns(1);
let started: Promise<Worker> | undefined;
let idle: NodeJS.Timeout | undefined;

/** The reader and the letters it knows lie in packages beside this program, brought in on first use; nothing is fetched. */
const packages = createRequire(import.meta.url);
const lettersAt = () =>
	join(dirname(packages.resolve('@tesseract.js-data/eng/package.json')), '4.0.0_best_int');

/** Without the words of a language: a plate is codes and names, which a dictionary would bend. */
async function start(): Promise<Worker> {
	const { createWorker } = packages('tesseract.js') as typeof import('tesseract.js');
	const settings = {
		langPath: lettersAt(),
		cacheMethod: 'none',
		errorHandler: stopReader
	};
	const worker = await createWorker('eng', 1, settings, {
		load_system_dawg: '0',
		load_freq_dawg: '0'
	});
	// a thread that dies must not take the program with it; who waits for it is told by the limit
	if ('worker' in worker && worker.worker instanceof Thread) worker.worker.on('error', stopReader);
	return worker;
}

/** Ends the reader's thread; the next picture starts another. */
export function stopReader(): void {
	clearTimeout(idle);
	const ended = started;
	started = undefined;
	ended?.then(
		(worker) => worker.terminate(),
		() => undefined
	);
}

function restLater(): void {
	clearTimeout(idle);
	idle = setTimeout(stopReader, IDLE_MS);
	idle.unref();
}

const slopeOf = ({ x0, y0, x1, y1 }: { x0: number; y0: number; x1: number; y1: number }) =>
	x1 === x0 ? 0 : (Math.atan2(y1 - y0, x1 - x0) * 180) / Math.PI;

export type Reader = (picture: Buffer, layout: Layout) => Promise<ReadWord[]>;

async function look(worker: Worker, picture: Buffer, layout: Layout): Promise<ReadWord[]> {
	const options = { ...QUIET, tessedit_pageseg_mode: LAYOUT[layout] };
	const { data } = await worker.recognize(picture, options as object, {
		blocks: true,
		text: false
	});
	const lines = (data.blocks ?? []).flatMap((block) =>
		block.paragraphs.flatMap((paragraph) => paragraph.lines)
	);
	return lines.flatMap((line) =>
		line.words.map((word) => ({
			text: word.symbols.map((symbol) => symbol.text).join(''),
			sure: word.symbols.flatMap(({ text, confidence }) =>
				Array<number>(text.length).fill(confidence / 100)
			),
			box: word.bbox,
			slope: slopeOf(line.baseline)
		}))
	);
}

/** Lends the reader for one picture, looked at as often as needed; a reader that breaks or dawdles is ended. */
export const withReader = <T>(work: (read: Reader) => Promise<T>): Promise<T> =>
	turn(async () => {
		clearTimeout(idle);
		try {
			const worker = await within(LIMIT_MS, (started ??= start()));
			return await work((picture, layout) => within(LIMIT_MS, look(worker, picture, layout)));
		} catch (fault) {
			stopReader();
			throw fault;
		} finally {
			restLater();
		}
	});
