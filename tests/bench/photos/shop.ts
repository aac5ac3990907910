import { Buffer } from 'node:buffer';
import { randomUUID } from 'node:crypto';
import { Agent, request } from 'node:http';
import { json } from 'node:stream/consumers';
import { BASE, visitor } from '../../support/visitor';

export interface Sent {
	status: number;
	message?: string;
	links?: Record<string, string>;
}

const HEAD = Buffer.from(
	'--bench\r\nContent-Disposition: form-data; name="file"; filename="a.jpg"\r\n\r\n'
);
const bodies = new Map<Buffer, Buffer>();

/** The form round a photo, made once: making it is the phone's work. */
function bodyOf(bytes: Buffer): Buffer {
	const body = bodies.get(bytes) ?? Buffer.concat([HEAD, bytes, Buffer.from('\r\n--bench--\r\n')]);
	bodies.set(bytes, body);
	return body;
}

const agent = new Agent({ keepAlive: true });

const post = (url: string, body: Buffer, headers: Record<string, string>): Promise<Sent> =>
	new Promise((done, fail) => {
		const sent = request(url, { method: 'POST', agent, headers }, (answer) => {
			void json(answer).then((told) =>
				done({ ...(told as object), status: answer.statusCode ?? 0 })
			);
		});
		sent.once('error', fail);
		sent.setHeader('content-length', body.length);
		sent.end(body);
	});

/** A member of the demo shop who sends photos to a donor of his own. */
export async function openShop() {
	const member = await visitor('bench@osiergate.example');
	const { cookies } = await member.storageState();
	const cookie = cookies.map(({ name, value }) => `${name}=${value}`).join('; ');
	const taken = await member.post('/api/osiergate/donors', {
		headers: { 'idempotency-key': randomUUID() },
		data: { model: 'BENCH-12' }
	});
	const { number }: { number: string } = await taken.json();
	const send = (bytes: Buffer): Promise<Sent> =>
		post(`${BASE}/api/osiergate/donors/${number}/photos`, bodyOf(bytes), {
			...{ cookie, origin: BASE, 'idempotency-key': randomUUID() },
			'content-type': 'multipart/form-data; boundary=bench'
		});
	const fetched = async (path: string): Promise<Buffer> => {
		const answer = await fetch(BASE + path, { headers: { cookie } });
		return Buffer.from(await answer.arrayBuffer());
	};
	return { number, cookies, send, fetched };
}

export type Shop = Awaited<ReturnType<typeof openShop>>;
