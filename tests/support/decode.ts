import { execFile } from 'node:child_process';
import { mkdtemp, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';

const run = promisify(execFile);
/** What is sold as the coarsest label printer. */
const DPI = 203;

async function inFolder<T>(work: (folder: string) => Promise<T>): Promise<T> {
	const folder = await mkdtemp(join(tmpdir(), 'endplay-labels-'));
	try {
		return await work(folder);
	} finally {
		await rm(folder, { recursive: true, force: true });
	}
}

/** The pages of a PDF as a label printer draws them. */
export const rasterOf = (pdf: Buffer, dpi = DPI): Promise<Buffer[]> =>
	inFolder(async (folder) => {
		await writeFile(join(folder, 'labels.pdf'), pdf);
		const args = ['-r', String(dpi), '-gray', '-png', 'labels.pdf', 'page'];
		await run('pdftoppm', args, { cwd: folder });
		const pages = (await readdir(folder)).filter((name) => name.endsWith('.png')).sort();
		return Promise.all(pages.map((name) => readFile(join(folder, name))));
	});

/** What an independent decoder reads in a picture; nothing when it finds no code. */
export const decode = (picture: Buffer): Promise<string[]> =>
	inFolder(async (folder) => {
		await writeFile(join(folder, 'picture.png'), picture);
		const asked = run(
			'zbarimg',
			['-q', '--nodbus', '--raw', '-Sdisable', '-Sqrcode.enable', 'picture.png'],
			{ cwd: folder }
		);
		const { stdout } = await asked.catch((fault: { code?: number; stdout?: string }) => {
			// 4: no code was found, which is an answer.
			if (fault.code === 4) return { stdout: '' };
			throw fault;
		});
		return stdout.split('\n').filter(Boolean);
	});

/** The words of a PDF, as one who copies them out of it gets them. */
export const wordsOf = (pdf: Buffer): Promise<string> =>
	inFolder(async (folder) => {
		await writeFile(join(folder, 'labels.pdf'), pdf);
		return (await run('pdftotext', ['-layout', 'labels.pdf', '-'], { cwd: folder })).stdout;
	});

/** Each page's width and height in mm. */
export const pageSizes = (pdf: Buffer): Promise<[number, number][]> =>
	inFolder(async (folder) => {
		await writeFile(join(folder, 'labels.pdf'), pdf);
		const { stdout } = await run('pdfinfo', ['-l', '-1', 'labels.pdf'], { cwd: folder });
		const found = stdout.matchAll(/size:\s+([\d.]+) x ([\d.]+) pts/g);
		return [...found].map(([, width, height]) => [inMm(width), inMm(height)]);
	});

const inMm = (points: string | undefined) => Math.round((Number(points) / 72) * 254) / 10;
