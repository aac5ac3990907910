// The store: bytes too large for the database, under keys, over its S3 wire.
// For putting, reading, listing and removing keys.
// Not for what the bytes are or who may see them; never to be called inside a transaction.
import { NotFound } from '$lib/refusal';
import { Client } from 'minio';
import type { Readable } from 'node:stream';
import { env } from '../env';

export interface StoredKey {
	key: string;
	changedAt: Date;
}

let client: Client | undefined;
let bucketReady: Promise<void> | undefined;

function store(): Client {
	const { S3_ENDPOINT, S3_ACCESS_KEY, S3_SECRET_KEY, S3_REGION } = env();
	const url = new URL(S3_ENDPOINT);
	const useSSL = url.protocol === 'https:';
	return (client ??= new Client({
		endPoint: url.hostname,
		port: Number(url.port) || (useSSL ? 443 : 80),
		useSSL,
		accessKey: S3_ACCESS_KEY,
		secretKey: S3_SECRET_KEY,
		region: S3_REGION,
		pathStyle: true
	}));
}

const bucket = () => env().S3_BUCKET;

async function makeBucket(): Promise<void> {
	if (await store().bucketExists(bucket())) return;
	try {
		await store().makeBucket(bucket(), env().S3_REGION);
	} catch (fault) {
		// Another process may have been first.
		if (!(await store().bucketExists(bucket()))) throw fault;
	}
}

/** Makes the bucket on first use; a failure is tried again by the next caller. */
async function ready(): Promise<Client> {
	bucketReady ??= makeBucket();
	try {
		await bucketReady;
	} catch (fault) {
		bucketReady = undefined;
		throw fault;
	}
	return store();
}

export async function putKey(key: string, bytes: Buffer, type: string): Promise<void> {
	await (await ready()).putObject(bucket(), key, bytes, bytes.length, { 'Content-Type': type });
}

const isMissing = (fault: unknown) =>
	fault instanceof Error && 'code' in fault && ['NoSuchKey', 'NotFound'].includes(`${fault.code}`);

export async function getKey(key: string): Promise<Readable> {
	try {
		return await (await ready()).getObject(bucket(), key);
	} catch (fault) {
		if (isMissing(fault)) throw new NotFound();
		throw fault;
	}
}

export async function* listKeys(prefix: string): AsyncGenerator<StoredKey> {
	const found = (await ready()).listObjectsV2(bucket(), prefix, true);
	for await (const item of found)
		if (item.name) yield { key: item.name, changedAt: item.lastModified };
}

export async function removeKeys(keys: string[]): Promise<void> {
	if (keys.length > 0) await (await ready()).removeObjects(bucket(), keys);
}

/** Answers when the store can be reached. */
export async function storeAnswers(): Promise<void> {
	await ready();
	await store().bucketExists(bucket());
}
