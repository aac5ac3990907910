import { CustomerEdit, CustomerInput } from '$lib/customers/input';
import { TemplateInput } from '$lib/customers/settings';
import { PLACEHOLDERS, written } from '$lib/customers/templates';
import { and, eq } from 'drizzle-orm';
import { simpleParser, type ParsedMail } from 'mailparser';
import type { AddressInfo } from 'node:net';
import { SMTPServer } from 'smtp-server';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { queued } from '../../../../tests/support/queue';
import { testShops, type TestShop } from '../../../../tests/support/shops';
import { inShop } from '../context';
import { event } from '../people/tables';
import {
	addCustomer,
	customerRow,
	editCustomer,
	eraseCustomer,
	exportCustomers,
	findLetter,
	getCustomer,
	letterSettings,
	listCustomers,
	listTemplates,
	saveLetterSettings,
	saveTemplate,
	sendAgain,
	startLetters,
	stopLetters,
	templateFor,
	writeLetter
} from '.';
import { sendWaiting, type Sending } from './send';

/** What the mail server says to the next letters: nothing, try later, or never. */
let says: 'ok' | 'later' | 'never' = 'ok';
const arrived: ParsedMail[] = [];
const answers = { ok: null, later: [451, 'try later'], never: [550, 'no such reader'] } as const;
const server = new SMTPServer({
	authOptional: true,
	disabledCommands: ['STARTTLS'],
	onData(stream, _session, done) {
		const answer = answers[says];
		void simpleParser(stream).then((letter) => {
			if (!answer) arrived.push(letter);
			done(answer && Object.assign(new Error(answer[1]), { responseCode: answer[0] }));
		});
	}
});

let ours: TestShop, theirs: TestShop;
beforeAll(async () => {
	await new Promise<void>((ready) => server.listen(0, '127.0.0.1', ready));
	process.env.SMTP_URL = `smtp://127.0.0.1:${(server.server.address() as AddressInfo).port}`;
	({ ours, theirs } = await testShops());
});
afterAll(() => new Promise<void>((closed) => server.close(() => closed())));
beforeEach(() => {
	says = 'ok';
	arrived.length = 0;
});

let people = 0;
const person = (over: Partial<CustomerInput> = {}) =>
	CustomerInput.parse({
		...{ name: `Zoë Brénnick ${++people}`, email: `zoe-${people}@mail.example` },
		...over
	});
const add = async (over: Partial<CustomerInput> = {}) =>
	(await addCustomer(ours.ctx, person(over))).id;

/** Writes a letter and gives the job that the queue got for it. */
async function write(id: number): Promise<Sending> {
	const letterId = await inShop(ours.ctx, async (tx, ctx) => {
		const to = await customerRow(tx, ctx, id);
		const values = { ...PLACEHOLDERS, shop: 'Ours' };
		const letter = written(await templateFor(tx, ctx, 'part'), values);
		return writeLetter(tx, ctx, { ...letter, to, about: 'want', aboutId: 1 });
	});
	return newestJob(letterId);
}
const newestJob = async (letterId: number) =>
	(await queued<Sending>('customers.letter')).filter((job) => job.letterId === letterId).at(-1)!;
const send = (sending: Sending) => sendWaiting(ours.ctx.db, sending, ours.ctx.now);
const stateOf = async (id: number) => (await getCustomer(ours.ctx, id)).letters[0]!;

describe('a customer', () => {
	it('is found by a piece of the name or the number, in this shop alone', async () => {
		const id = await add({ name: 'Perran Quoyle', phone: '(555) 014-2299', email: '' });
		await addCustomer(theirs.ctx, person({ name: 'Perran Quoyle' }));
		for (const q of ['quoy', 'PERRAN q', '014 22', '5550142299']) {
			const { items } = await listCustomers(ours.ctx, { q });
			expect(
				items.map((one) => one.id),
				q
			).toEqual([id]);
		}
		expect((await listCustomers(ours.ctx, { q: '%' })).items).toEqual([]);
		expect((await listCustomers(ours.ctx, { q: 'nobody' })).items).toEqual([]);
	});

	it('is not entered twice', async () => {
		await add({ name: 'Wenna Treloar', phone: '555 0100 200', email: 'wenna@mail.example' });
		for (const same of [{ phone: '555-0100-200', email: '' }, { email: 'wenna@mail.example' }])
			await expect(add(same)).rejects.toThrow('Wenna Treloar has this number or address already');
	});

	it('is listed page by page', async () => {
		const { ours: shop } = await testShops();
		for (const name of ['Cador', 'annis', 'Bersaba'])
			await addCustomer(shop.ctx, person({ name, email: '' }));
		const names: string[] = [];
		let after: number | undefined;
		do {
			const page = await listCustomers(shop.ctx, { limit: 2, ...(after ? { after } : {}) });
			names.push(...page.items.map(({ name }) => name));
			after = page.next ? Number(page.next) : undefined;
		} while (after);
		expect(names).toEqual(['annis', 'Bersaba', 'Cador']);
	});

	it('saved twice from the same page is refused with both sides', async () => {
		const id = await add({ note: 'calls early' });
		const { version } = await getCustomer(ours.ctx, id);
		const edit = (note: string) =>
			editCustomer(ours.ctx, id, CustomerEdit.parse({ ...person(), note, version }));
		await edit('calls late');
		await expect(edit('calls never')).rejects.toThrow(
			'note is now “calls late”, you typed “calls never”'
		);
	});

	it('is deleted with name and reach, in the events too; the row stays', async () => {
		const id = await add({ name: 'Keverne Pask', phone: '555 777 8888', note: 'limps' });
		await write(id);
		await eraseCustomer(ours.ctx, id);
		const left = await getCustomer(ours.ctx, id);
		expect(left).toMatchObject({ name: 'a customer', phone: '', email: '', note: '' });
		expect((await listCustomers(ours.ctx, { q: 'keverne' })).items).toEqual([]);
		expect(JSON.stringify(await exportCustomers(ours.ctx))).not.toContain('Keverne');
		const events = await inShop(ours.ctx, (tx) =>
			tx
				.select()
				.from(event)
				.where(and(eq(event.shopId, ours.ctx.shopId), eq(event.about, 'customer')))
		);
		expect(events.map(({ what }) => what)).toContain('erased');
		expect(JSON.stringify(events)).not.toMatch(/Keverne|mail\.example|limps|777/);
		await expect(eraseCustomer(ours.ctx, id)).rejects.toThrow('not here');
	});
});

describe('a letter', () => {
	it('leaves once, however often the job runs, with a way to stop such letters', async () => {
		await saveLetterSettings(ours.ctx, {
			...{ replyTo: 'counter@shop.example', tellByItself: false, quietDays: 7, version: 0 }
		});
		const id = await add();
		const sending = await write(id);
		for (let times = 0; times < 3; times++) await send(sending);
		expect(arrived).toHaveLength(1);
		const [letter] = arrived;
		expect(letter!.text).toContain('We ask $28 for it.');
		expect(letter!.replyTo?.text).toBe('counter@shop.example');
		const list = letter!.headers.get('list') as { unsubscribe?: { url: string } };
		expect(list.unsubscribe?.url).toContain(`/letters/${sending.token}`);
		const lines = letter!.headerLines.map(({ line }) => line);
		expect(lines).toContain('List-Unsubscribe-Post: List-Unsubscribe=One-Click');
		expect(letter!.messageId).toContain(`letter-${ours.ctx.shopId}-${sending.letterId}@`);
		expect(await stateOf(id)).toMatchObject({ state: 'sent', tries: 1 });
	});

	it('waits while the mail server is away, and is the same letter when it goes', async () => {
		const id = await add();
		const sending = await write(id);
		says = 'later';
		await expect(send(sending)).rejects.toThrow('try later');
		await expect(send(sending)).rejects.toThrow('try later');
		expect(await stateOf(id)).toMatchObject({ state: 'waiting', tries: 2 });
		says = 'ok';
		await send(sending);
		expect(arrived).toHaveLength(1);
		expect(await stateOf(id)).toMatchObject({ state: 'sent', tries: 3, fault: '' });
	});

	it('that does not go is marked: at once where there is no such reader, else after ten tries', async () => {
		const id = await add();
		const sending = await write(id);
		says = 'never';
		await send(sending);
		expect(await stateOf(id)).toMatchObject({
			state: 'failed',
			fault: expect.stringContaining('550')
		});
		await sendAgain(ours.ctx, sending.letterId);
		const again = await newestJob(sending.letterId);
		expect(again.token).not.toBe(sending.token);
		says = 'later';
		for (let times = 0; times < 9; times++) await expect(send(again)).rejects.toThrow();
		await send(again);
		expect(await stateOf(id)).toMatchObject({ state: 'failed', tries: 10 });
		await send(sending);
		expect(arrived).toEqual([]);
	});

	it('is stopped by its link, and only by it, until the reader or another address wants it again', async () => {
		const id = await add();
		const { token } = await write(id);
		const { db, now } = ours.ctx;
		expect(await findLetter(db, token)).toEqual({ shopName: 'Ours', off: false });
		await stopLetters(db, token, now);
		await stopLetters(db, token, now);
		expect((await getCustomer(ours.ctx, id)).lettersOffAt).toEqual(now);
		expect((await findLetter(db, token)).off).toBe(true);
		await startLetters(db, token, now);
		expect((await getCustomer(ours.ctx, id)).lettersOffAt).toBeNull();
		await stopLetters(db, token, now);
		const { version } = await getCustomer(ours.ctx, id);
		await editCustomer(ours.ctx, id, CustomerEdit.parse({ ...person(), version }));
		expect((await getCustomer(ours.ctx, id)).lettersOffAt).toBeNull();
		for (const wrong of ['no such link', `${token}x`])
			await expect(findLetter(db, wrong)).rejects.toThrow('not known');
		await expect(stopLetters(db, 'no such link', now)).rejects.toThrow('not known');
	});

	it('of a change that was rolled back is not in the queue', async () => {
		const id = await add();
		const before = await queued('customers.letter');
		const broken = inShop(ours.ctx, async (tx, ctx) => {
			const to = await customerRow(tx, ctx, id);
			const letter = { subject: 'x', text: 'x', to, about: 'want', aboutId: 1 };
			await writeLetter(tx, ctx, letter);
			throw new Error('broken off');
		});
		await expect(broken).rejects.toThrow('broken off');
		expect(await queued('customers.letter')).toEqual(before);
		expect((await getCustomer(ours.ctx, id)).letters).toEqual([]);
	});
});

describe('the words of a letter', () => {
	it('are the usual ones until the shop has its own, and again after', async () => {
		const usual = (await listTemplates(ours.ctx))[0]!;
		expect(usual).toMatchObject({ name: 'part', own: false, version: 0 });
		const own = { name: 'part' as const, subject: 'Here', text: 'Ring us, {name}.', version: 0 };
		await saveTemplate(ours.ctx, own);
		expect((await listTemplates(ours.ctx))[0]).toMatchObject({ own: true, text: own.text });
		expect((await listTemplates(theirs.ctx))[0]).toMatchObject({ own: false });
		await expect(saveTemplate(ours.ctx, own)).rejects.toThrow('saved this letter meanwhile');
		await saveTemplate(ours.ctx, { ...own, version: 1, usual: 'usual' });
		expect((await listTemplates(ours.ctx))[0]).toEqual(usual);
	});

	it('name nothing that there is not', () => {
		const said = TemplateInput.safeParse({
			name: 'part',
			subject: 'x',
			text: '{nmae}',
			version: 0
		});
		expect(said.error?.issues[0]?.message).toContain('There is nothing called {nmae}');
	});

	it('and the settings are the shop’s own', async () => {
		expect(await letterSettings(theirs.ctx)).toEqual({
			...{ replyTo: '', tellByItself: false, quietDays: 7, version: 0 }
		});
	});
});
