import { expect, request, test } from '@playwright/test';
import { spawn, type ChildProcess } from 'node:child_process';
import { createServer } from 'node:net';
import { PASSWORD } from '../support/visitor';

const ORIGIN = 'https://endplay.example';
let server: ChildProcess;
let base: string;

const freePort = () =>
	new Promise<number>((resolve) => {
		const probe = createServer().listen(0, '127.0.0.1', () => {
			const address = probe.address();
			probe.close(() => resolve(typeof address === 'object' && address ? address.port : 0));
		});
	});

test.beforeAll(async () => {
	const port = await freePort();
	base = `http://127.0.0.1:${port}`;
	const env = { ...process.env, ORIGIN, PORT: `${port}`, HOST: '127.0.0.1', LOG_LEVEL: 'silent' };
	server = spawn(process.execPath, ['build/index.js'], { env, stdio: 'ignore' });
	await expect(async () => expect((await fetch(`${base}/livez`)).status).toBe(200)).toPass({
		timeout: 20_000
	});
});
test.afterAll(() => void server.kill());

test('served over TLS, the session cookie is bound to the host and browsers stay on TLS', async () => {
	const who = await request.newContext({
		baseURL: base,
		maxRedirects: 0,
		extraHTTPHeaders: { origin: ORIGIN }
	});
	const answer = await who.post('/sign-in?/password', {
		form: {
			providerId: 'credentials',
			email: 'bench@osiergate.example',
			password: PASSWORD,
			redirectTo: '/'
		}
	});
	const cookies = answer.headersArray().filter((one) => one.name.toLowerCase() === 'set-cookie');
	const session =
		cookies.find((one) => one.value.startsWith('__Host-endplay.session='))?.value ?? '';
	expect(session).toMatch(/; Path=\/(;|$)/);
	expect(session).toContain('Secure');
	expect(session).toContain('HttpOnly');
	expect(session).toContain('SameSite=Lax');
	expect(session).not.toContain('Domain=');
	expect(answer.headers()['strict-transport-security']).toContain('max-age=63072000');
});
