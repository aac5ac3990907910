import { expect, test } from '@playwright/test';
import { visitor } from '../support/visitor';

/** Pages of a shop and who sees them; the others are told who may. */
const PAGES: Record<string, string> = {
	parts: 'owner counter bench reader',
	donors: 'owner counter bench reader',
	bins: 'owner counter bench reader',
	prices: 'owner counter bench reader',
	people: 'owner counter bench reader',
	'donors/new': 'owner counter bench',
	'donors/D1': 'owner counter bench reader',
	'parts/new': 'owner counter bench',
	'prices/new': 'owner counter',
	worth: 'owner counter',
	'people/shop': 'owner'
};
const ROLES = ['owner', 'counter', 'bench', 'reader'];

test('each page opens to the roles of the table and to nobody else', async () => {
	for (const role of ROLES) {
		const who = await visitor(`${role}@osiergate.example`);
		for (const [page, roles] of Object.entries(PAGES)) {
			const answer = await who.get(`/osiergate/${page}`);
			expect(answer.status(), `${role} at ${page}`).toBe(roles.includes(role) ? 200 : 403);
		}
		await who.dispose();
	}
});

test('a stranger is asked to sign in and then goes on to the page', async () => {
	const who = await visitor();
	for (const page of Object.keys(PAGES)) {
		const answer = await who.get(`/osiergate/${page}`);
		expect(answer.status(), page).toBe(303);
		expect(answer.headers().location).toBe(
			`/sign-in?to=${encodeURIComponent(`/osiergate/${page}`)}`
		);
	}
	expect((await who.get('/api/osiergate/parts')).status()).toBe(401);
});

test("another shop's address is the same as one that does not exist", async () => {
	const who = await visitor('owner@osiergate.example');
	for (const page of ['parts', 'donors/D1', 'people']) {
		const foreign = await who.get(`/thrennick/${page}`);
		const unknown = await who.get(`/no-such-shop/${page}`);
		expect(foreign.status()).toBe(404);
		expect(await foreign.text()).toBe(await unknown.text());
	}
	const foreign = await who.get('/api/thrennick/parts');
	const unknown = await who.get('/api/no-such-shop/parts');
	expect(foreign.status()).toBe(404);
	expect(await foreign.body()).toEqual(await unknown.body());
});

test('every kind of answer carries the headers', async () => {
	const who = await visitor('reader@osiergate.example');
	for (const path of [
		'/sign-in',
		'/osiergate/parts',
		'/api/osiergate/parts',
		'/api/openapi.json',
		'/osiergate/worth',
		'/nowhere-at-all/x',
		'/drawings.svg'
	]) {
		const headers = (await who.get(path)).headers();
		expect(headers['x-content-type-options'], path).toBe('nosniff');
		expect(headers['x-frame-options'], path).toBe('DENY');
		expect(headers['referrer-policy'], path).toBe('same-origin');
		expect(headers['cross-origin-opener-policy'], path).toBe('same-origin');
		if (!headers['content-type']?.startsWith('text/html')) continue;
		const policy = headers['content-security-policy'] ?? '';
		expect(policy, path).toContain("default-src 'none'");
		expect(policy, path).toContain("frame-ancestors 'none'");
		const scripts = policy.split(';').find((one) => one.trim().startsWith('script-src')) ?? '';
		expect(scripts, path).not.toContain('unsafe-inline');
		expect(scripts, path).not.toContain("'unsafe-eval'");
	}
});

test('a form sent from another site is refused', async () => {
	const who = await visitor('owner@osiergate.example');
	const answer = await who.post('/osiergate/people?/season', {
		form: { season: 'rush', idempotencyKey: 'from-elsewhere' },
		headers: { origin: 'https://elsewhere.example' }
	});
	expect(answer.status()).toBe(403);
});
