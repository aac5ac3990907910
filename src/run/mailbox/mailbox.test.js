import { mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import nodemailer from 'nodemailer';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { startMailbox } from './index.js';

const dir = mkdtempSync(join(tmpdir(), 'endplay-mail-'));
/** @type {Awaited<ReturnType<typeof startMailbox>>} */
let mailbox;

beforeAll(async () => {
	mailbox = await startMailbox({ dir });
});
afterAll(async () => {
	await mailbox.stop();
	rmSync(dir, { recursive: true, force: true });
});

/** @param {import('nodemailer').SendMailOptions} letter */
async function post(letter) {
	const sender = nodemailer.createTransport(mailbox.smtpUrl);
	await sender.sendMail({ from: 'Endplay <post@endplay.example>', ...letter });
	sender.close();
}

/** @param {string} to */
const lettersTo = async (to) =>
	/** @type {{ to: string[], subject: string, text: string, links: string[] }[]} */ (
		await (await fetch(`${mailbox.pageUrl}/letters.json?to=${encodeURIComponent(to)}`)).json()
	);

test('letters come back by address, newest first, with their links', async () => {
	const text =
		'Sign in: http://localhost:3000/sign-in?token=a_b-c&email=x%40y.example.\nÄ good day.';
	await post({ to: 'Bench@osiergate.example', subject: 'First', text: 'one' });
	await post({ to: 'bench@osiergate.example', subject: 'Zwölf', text });
	await post({ to: 'owner@thrennick.example', subject: 'Other shop', text: 'three' });
	const found = await lettersTo('bench@osiergate.example');
	expect(found.map(({ subject }) => subject)).toEqual(['Zwölf', 'First']);
	expect(found[0]?.text).toContain('Ä good day.');
	expect(found[0]?.links).toEqual([
		'http://localhost:3000/sign-in?token=a_b-c&email=x%40y.example'
	]);
});

test('a blind copy reaches its reader', async () => {
	await post({ to: 'a@shop.example', bcc: 'b@shop.example', subject: 'Both', text: 'x' });
	expect((await lettersTo('b@shop.example')).map(({ subject }) => subject)).toEqual(['Both']);
});

test('the page links what is a link and shows the rest as text', async () => {
	const html = '<script>alert(1)</script><a href="http://evil.example">here</a>';
	const text = 'See http://localhost:3000/a?b=1&c="2" <b>bold</b>';
	await post({ to: 'page@shop.example', subject: '<i>Slanted</i>', text, html });
	const list = await (await fetch(mailbox.pageUrl)).text();
	expect(list).toContain('&lt;i&gt;Slanted&lt;/i&gt;');
	const path = /href="(\/letters\/[^"]+)"/.exec(list)?.[1] ?? '';
	const page = await (await fetch(`${mailbox.pageUrl}${path}`)).text();
	expect(page).toContain('<a href="http://localhost:3000/a?b=1&amp;c=" rel="noreferrer">');
	expect(page).toContain('&lt;b&gt;bold&lt;/b&gt;');
	expect(page).toContain('&lt;script&gt;');
	expect(page).not.toMatch(/<(script|i|b)>/);
});

test('letters are files that outlive a restart, and an unknown one is not found', async () => {
	const before = readdirSync(dir).filter((name) => name.endsWith('.eml')).length;
	const { pageUrl } = mailbox;
	await mailbox.stop();
	mailbox = await startMailbox({ dir });
	expect(mailbox.pageUrl).toBe(pageUrl);
	expect(before).toBeGreaterThan(4);
	expect((await lettersTo('b@shop.example')).length).toBe(1);
	expect((await fetch(`${mailbox.pageUrl}/letters/..%2Fsmtp-port`)).status).toBe(404);
});
