import fc from 'fast-check';
import { expect, it } from 'vitest';
import { PHOTO_BYTES, PHOTO_SAID } from './limits';
import type { OnPhone } from './on-phone';
import { Tray } from './tray.svelte';
import type { Tools } from './tools';
import { targetOf, type Account, type Answer, type WaitingPhoto } from './waiting';

/** The photo arrived, the answer did not. */
const LOST = -1;
const me: Account = { person: 'p1', name: 'Corwin', shop: 'ours' };
const donor = targetOf('/api/ours/donors/D12/photos', 'front');
const settle = () => new Promise((done) => setTimeout(done));
const files = (count: number) =>
	Array.from({ length: count }, (_, at) => new File([`photo ${at}`], `${at}.jpg`));

/** A phone that keeps what it is given, as copies, like the real one. */
function shelf(): OnPhone & {
	photos: Map<string, WaitingPhoto>;
	bodies: Map<string, ArrayBuffer>;
} {
	const photos = new Map<string, WaitingPhoto>();
	const bodies = new Map<string, ArrayBuffer>();
	const put = async (photo: WaitingPhoto, bytes: ArrayBuffer) => {
		photos.set(photo.key, structuredClone(photo));
		bodies.set(photo.key, bytes);
	};
	return {
		photos,
		bodies,
		put,
		list: async () => [...photos.values()].map((one) => structuredClone(one)),
		body: async (key) => bodies.get(key),
		async finish(photo, bytes) {
			const there = photos.get(photo.key);
			if (!there || there.ready || there.dropped) return false;
			await put(photo, bytes);
			return true;
		},
		async note(photo) {
			if (photos.has(photo.key)) photos.set(photo.key, structuredClone(photo));
		},
		async remove(keys) {
			for (const key of keys) {
				photos.delete(key);
				bodies.delete(key);
			}
		}
	};
}

/** A shop that keeps photos by their keys, behind a wire that answers when told to. */
function world() {
	const phone = shelf();
	const stored = new Map<string, string>();
	const going = new Map<string, (answer: Answer) => void>();
	const sent: string[] = [];
	const timers: { at: number; call: () => void }[] = [];
	const clock = { now: 1_000_000 };
	const tools: Tools = {
		phone,
		now: () => clock.now,
		chance: () => 0.5,
		later: (ms, call) => void timers.push({ at: clock.now + ms, call }),
		link: () => 'blob:small',
		unlink: () => {},
		tell: () => {},
		alone: (_, work) => work(),
		shrink: async (file, whole, onThumb) => {
			onThumb(new Blob(['small']));
			return whole ? null : new Blob([`${await file.text()}, small`], { type: 'image/webp' });
		},
		send: ({ key, file }, body, onShare) =>
			new Promise((done) => {
				sent.push(key);
				going.set(file, (answer) => {
					onShare(1);
					void body.text().then((text) => {
						if (answer.status === 201 || answer.status === LOST) {
							expect(stored.get(key) ?? text).toBe(text);
							stored.set(key, text);
						}
						done(answer.status === LOST ? { status: 0 } : answer);
					});
				});
			})
	};
	const pass = async (ms: number) => {
		clock.now += ms;
		for (const timer of timers.splice(0))
			(timer.at <= clock.now ? timer.call : () => timers.push(timer))();
		await settle();
	};
	const answer = async (file: string, status: number, message?: string) => {
		going.get(file)?.({ status, ...(message ? { message } : {}) });
		going.delete(file);
		await settle();
	};
	return { phone, stored, going, sent, tools, pass, answer, clock };
}

const states = (tray: Tray) => tray.list.map((one) => one.state);

it('sends two at a time, each under a key of its own, made small', async () => {
	const { tools, going, sent, answer, stored, phone } = world();
	const tray = new Tray(me, tools);
	tray.add(files(5), donor);
	await settle();
	expect([...going.keys()]).toEqual(['0.jpg', '1.jpg']);
	await answer('0.jpg', 201);
	expect([...going.keys()]).toEqual(['1.jpg', '2.jpg']);
	for (const at of [1, 2, 3, 4]) await answer(`${at}.jpg`, 201);
	expect(new Set(sent).size).toBe(5);
	expect([...stored.values()].sort()[0]).toBe('photo 0, small');
	expect(phone.photos.size + phone.bodies.size).toBe(0);
	expect(tray.count).toBe(0);
});

it('a failed one stops no other; it goes again under the same key, or is thrown away', async () => {
	const { tools, sent, answer } = world();
	const tray = new Tray(me, tools);
	tray.add(files(3), donor);
	await settle();
	await answer('0.jpg', 400, 'This is not a photo.');
	await answer('1.jpg', 201);
	await answer('2.jpg', 201);
	expect(states(tray)).toEqual(['failed', 'sent', 'sent']);
	expect(tray.list[0]?.said).toBe('This is not a photo.');
	const failed = tray.list[0]?.key ?? '';
	tray.retry(failed);
	await settle();
	expect(sent.filter((key) => key === failed)).toHaveLength(2);
	await answer('0.jpg', 400, 'Still not.');
	tray.drop(failed);
	expect([states(tray)[0], tray.count]).toEqual(['dropped', 0]);
	tray.undrop(failed);
	expect([states(tray)[0], tray.count]).toEqual(['failed', 1]);
});

it('without a signal they wait, longer each time, and go when there is one', async () => {
	const { tools, sent, answer, pass } = world();
	const tray = new Tray(me, tools);
	tray.add(files(1), donor);
	await settle();
	await answer('0.jpg', 0);
	expect(states(tray)).toEqual(['waits']);
	await pass(1500);
	expect(sent).toHaveLength(1);
	await pass(600);
	expect(sent).toHaveLength(2);
	await answer('0.jpg', 0);
	await pass(2100);
	expect(sent).toHaveLength(2);
	tray.wake();
	await settle();
	expect(sent).toHaveLength(3);
	await answer('0.jpg', 201);
	expect(states(tray)).toEqual(['sent']);
});

it('outlives its page: the next one sends the same bytes under the same key', async () => {
	const { tools, sent, answer, going, stored, phone } = world();
	const first = new Tray(me, tools);
	first.add(files(2), donor);
	await settle();
	going.clear();
	const second = new Tray(me, tools);
	await second.look();
	await settle();
	expect(second.count).toBe(2);
	await answer('0.jpg', 201);
	await answer('1.jpg', 201);
	expect(new Set(sent).size).toBe(2);
	expect([...stored.values()].sort()).toEqual(['photo 0, small', 'photo 1, small']);
	expect(phone.photos.size).toBe(0);
});

it('one whose page was left before it was small is made small by the next', async () => {
	const { tools, answer, clock, phone } = world();
	const stuck = new Tray(me, { ...tools, shrink: () => new Promise(() => {}) });
	stuck.add(files(1), donor);
	await settle();
	expect([...phone.photos.values()][0]?.ready).toBe(false);
	clock.now += 60_000;
	const next = new Tray(me, tools);
	await next.look();
	await settle();
	await answer('0.jpg', 201);
	expect(states(next)).toEqual(['sent']);
});

it('never sends what another person took, nor to another shop', async () => {
	const { tools, sent, going } = world();
	const theirs = new Tray(me, tools);
	theirs.add(files(2), donor);
	await settle();
	going.clear();
	sent.length = 0;
	const other = new Tray({ person: 'p2', name: 'Tamsel', shop: 'ours' }, tools);
	await other.look();
	const elsewhere = new Tray({ ...me, shop: 'theirs' }, tools);
	await elsewhere.look();
	await settle();
	expect([other.count, elsewhere.count, sent.length]).toEqual([0, 0, 0]);
	expect(other.others.map((one) => one.name)).toEqual(['Corwin', 'Corwin']);
	expect(elsewhere.others).toEqual([]);
	await other.empty('others');
	const again = new Tray(me, tools);
	await again.look();
	expect(again.count).toBe(0);
});

it('a phone that keeps nothing sends from memory and says so', async () => {
	const { tools, answer, stored } = world();
	const full = { ...tools.phone, put: () => Promise.reject(new Error('full')) };
	const tray = new Tray(me, { ...tools, phone: full });
	tray.add(files(1), donor);
	await settle();
	expect(tray.list[0]?.kept).toBe(false);
	await answer('0.jpg', 0);
	tray.wake();
	await settle();
	await answer('0.jpg', 201);
	expect([...stored.values()]).toEqual(['photo 0, small']);
});

it('takes fifty at once and says how many were too many; one that is too large fails in words', async () => {
	const { tools } = world();
	const tray = new Tray(me, tools);
	expect(tray.add(files(53), donor)).toBe(3);
	expect(tray.list).toHaveLength(50);
	const large = Object.defineProperty(new File([], 'x.jpg'), 'size', { value: PHOTO_BYTES + 1 });
	const second = new Tray(me, world().tools);
	second.add([large], donor, true);
	expect(second.list[0]?.said).toBe(PHOTO_SAID.size);
});

it('tells its page when it is at rest, and clears what was sent', async () => {
	const { tools, answer } = world();
	const tray = new Tray(me, tools);
	let told = 0;
	tray.listen(donor.page, () => told++);
	tray.add(files(2), donor);
	await settle();
	await answer('0.jpg', 201);
	expect(told).toBe(0);
	await answer('1.jpg', 400, 'lost');
	expect(told).toBe(1);
	tray.clear(donor.page);
	expect(states(tray)).toEqual(['failed']);
});

it('whatever comes back or does not, each photo is stored once or still there', async () => {
	const answers = fc.array(fc.constantFrom(0, 0, LOST, 201, 401, 500, 503, 400), { maxLength: 40 });
	await fc.assert(
		fc.asyncProperty(answers, fc.integer({ min: 1, max: 5 }), async (said, count) => {
			const { tools, going, stored, phone, pass, answer } = world();
			let tray = new Tray(me, tools);
			tray.add(files(count), donor);
			await settle();
			for (const [at, status] of said.entries()) {
				const [file] = going.keys();
				if (file) await answer(file, status, 'no');
				if (at % 7 === 6) {
					// The tab is killed.
					going.clear();
					tray = new Tray(me, tools);
					await tray.look();
				}
				await pass(400_000);
			}
			expect(new Set([...stored.keys(), ...phone.photos.keys()]).size).toBe(count);
			expect(stored.size).toBeLessThanOrEqual(count);
		}),
		{ numRuns: 40 }
	);
});
