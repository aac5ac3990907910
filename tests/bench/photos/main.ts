import { Client } from 'minio';
import { randomUUID } from 'node:crypto';
import type { Buffer } from 'node:buffer';
import { loadavg } from 'node:os';
import { buffer } from 'node:stream/consumers';
import { hostileFiles } from '../../support/hostile';
import { watched } from '../../support/server-process';
import { bare, median, twoAtATime } from './bare';
import { twelveMegapixels } from './pictures';
import { onScreen } from './screen';
import { openShop, type Shop } from './shop';

export interface Options {
	base: string;
	chromium: string;
	photos: number;
	rounds: number;
}

const say = (line: string) => process.stdout.write(`${line}\n`);
const ms = (figure: number) => `${figure.toFixed(0)} ms`;
const kb = (bytes: number) => `${(bytes / 1024).toFixed(0)} KB`;
const rule = (met: boolean) => (met ? 'met' : 'MISSED');

/** Uploads until all sizes are ready, against the same work with nothing round it, turn about. */
async function endToEnd(shop: Shop, photos: Buffer[], rounds: number) {
	await bare(photos[0]!);
	await shop.send(photos[0]!);
	const [alone, whole]: number[][] = [[], []];
	for (let round = 0; round < rounds; round += 1) {
		alone!.push(await twoAtATime(photos, bare));
		whole!.push(
			await twoAtATime(photos, async (bytes) => {
				const { status } = await shop.send(bytes);
				if (status !== 201) throw new Error(`A photo was answered with ${status}`);
			})
		);
	}
	return { bare: median(alone!), whole: median(whole!) };
}

/** What the way by the store would add: the raw bytes there, fetched by the server, and taken away. */
async function byTheStore(photos: Buffer[]): Promise<number | null> {
	const { S3_ENDPOINT, S3_ACCESS_KEY, S3_SECRET_KEY, S3_BUCKET = 'endplay' } = process.env;
	if (!S3_ENDPOINT || !S3_ACCESS_KEY || !S3_SECRET_KEY) return null;
	const { hostname, port, protocol } = new URL(S3_ENDPOINT);
	const store = new Client({
		...{ endPoint: hostname, port: Number(port), useSSL: protocol === 'https:', pathStyle: true },
		...{ accessKey: S3_ACCESS_KEY, secretKey: S3_SECRET_KEY, region: 'us-east-1' }
	});
	return twoAtATime(photos, async (bytes) => {
		const key = `raw/${randomUUID()}`;
		const link = await store.presignedPutObject(S3_BUCKET, key, 600);
		await fetch(link, { method: 'PUT', body: new Uint8Array(bytes) });
		await buffer(await store.getObject(S3_BUCKET, key));
		await store.removeObject(S3_BUCKET, key);
	});
}

async function thumbs(shop: Shop, photos: Buffer[]): Promise<number> {
	let sum = 0;
	for (let at = 0; at < 24; at += 1) {
		const { links } = await shop.send(photos[at % photos.length]!);
		sum += (await shop.fetched(links!.thumb!)).length;
	}
	return sum;
}

async function badFaith(base: string, shop: Shop) {
	const files = await hostileFiles();
	for (const { bytes } of files.slice(2, 4)) await shop.send(bytes);
	let slowest = { name: '', took: 0 };
	for (const { name, bytes } of files) {
		const began = performance.now();
		const { status, message } = await shop.send(bytes);
		const took = performance.now() - began;
		if (took > slowest.took) slowest = { name, took };
		say(
			`  ${ms(took).padStart(8)}  ${name}: ${status === 201 ? 'cleaned' : `${status} ${message}`}`
		);
	}
	const crowd = await watched(base, () =>
		Promise.all([...files, ...files].map(({ bytes }) => shop.send(bytes)))
	);
	return { slowest, ...crowd };
}

/** Returns how many goals were missed. */
export async function run({ base, chromium, photos: count, rounds }: Options): Promise<number> {
	const shop = await openShop();
	const photos = await twelveMegapixels(count);
	const bytes = photos.reduce((sum, one) => sum + one.length, 0) / count;
	const goals: boolean[] = [];
	const goal = (met: boolean) => rule((goals.push(met), met));
	say(`${count} photos of 12 megapixels, ${kb(bytes)} each; load ${loadavg()[0]!.toFixed(1)}`);

	const time = await endToEnd(shop, photos, rounds);
	const times = time.whole / time.bare;
	say(`upload to all sizes ready, two at a time: ${ms(time.whole)} a photo`);
	say(
		`bare sharp, the same work: ${ms(time.bare)}; ${times.toFixed(2)} x (1.2: ${goal(times <= 1.2)})`
	);
	const more = await byTheStore(photos);
	if (more !== null)
		say(`by a presigned upload it would be ${ms(more)} more, with the raw bytes at rest`);

	const sum = await thumbs(shop, photos);
	say(`24 thumbnails: ${kb(sum)} (350 KB: ${goal(sum <= 350 * 1024)})`);

	const screen = await onScreen(base, chromium, shop, photos.slice(0, 6));
	const sent = median(screen.sent);
	say(
		`sent by the phone: ${kb(sent)} a photo, at most ${kb(Math.max(...screen.sent))} (about 350 KB: ${goal(sent <= 350 * 1024)})`
	);
	say(`shutter to thumbnail: first ${ms(screen.cold[0] ?? 0)}, then ${ms(median(screen.plain))}`);
	say(
		`  page four times slower: ${ms(median(screen.page4))} (300 ms: ${goal(median(screen.page4) <= 300)})`
	);
	say(`  all threads four times slower: ${ms(median(screen.all4))}`);

	say('in bad faith:');
	const bad = await badFaith(base, shop);
	const livez = bad.waits.at(-1) ?? 0;
	say(
		`  slowest ${ms(bad.slowest.took)}, ${bad.slowest.name} (1 s: ${goal(bad.slowest.took <= 1000)})`
	);
	say(
		`  twenty at once: memory grew by ${bad.grown.toFixed(0)} MB (200: ${goal(bad.grown < 200)})`
	);
	say(`  /livez meanwhile: at most ${ms(livez)} (200 ms: ${goal(livez < 200)})`);
	return goals.filter((met) => !met).length;
}
