import type { PartView } from '$lib/parts/view';
import { checklist } from '$lib/trade';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { bin, donorOnBench, statesAndReplays } from '../../../../tests/support/bench';
import { NOON, testShops, type TestShop } from '../../../../tests/support/shops';
import { getDonor } from '../donors';
import {
	editPart,
	expireHolds,
	fitPart,
	foundPart,
	freePart,
	getPart,
	gradePart,
	hangPhoto,
	holdPart,
	missPart,
	movePart,
	provePart,
	pullPart,
	scrapPart,
	sellPart,
	takeBackPart,
	undoPart
} from '.';

let ours: TestShop, theirs: TestShop, donor: string, tag: string;

beforeAll(async () => {
	({ ours, theirs } = await testShops());
	donor = await donorOnBench(ours.ctx);
	for (const address of ['K3-1', 'K3-2']) await bin(ours.ctx, address);
	await bin(ours.ctx, 'R1', true);
	await bin(theirs.ctx, 'K3-1');
});

beforeEach(async () => {
	({ tag } = await pullPart(ours.ctx, donor, { kind: 'coil', grade: 'untested', bin: 'K3-1' }));
});

const now = (): Promise<PartView> => getPart(ours.ctx, tag);
const days = (count: number) => new Date(NOON.getTime() + count * 24 * 3600 * 1000);

describe('moving', () => {
	it('takes an address, the tag of a bin or of a box, however typed', async () => {
		await movePart(ours.ctx, tag.toLowerCase(), { bin: ' k3-2 ' });
		expect(await now()).toMatchObject({ bin: 'K3-2', state: 'shelved' });
		const box = (await getDonor(ours.ctx, donor)).boxes[0]!.tag;
		await movePart(ours.ctx, tag, { bin: box });
		expect(await now()).toMatchObject({ bin: `box ${donor}`, state: 'shelved' });
	});

	it('refuses the tag of a part as a place', async () => {
		await expect(movePart(ours.ctx, tag, { bin: tag })).rejects.toMatchObject({ field: 'bin' });
	});

	it('into the red bin makes it doubtful until a test is passed', async () => {
		await movePart(ours.ctx, tag, { bin: 'R1' });
		expect(await now()).toMatchObject({ state: 'back', doubtful: true });
		await expect(movePart(ours.ctx, tag, { bin: 'K3-1' })).rejects.toMatchObject({ code: 'gate' });
		await provePart(ours.ctx, tag, { how: 'bench test hot', passed: false });
		await expect(movePart(ours.ctx, tag, { bin: 'K3-1' })).rejects.toMatchObject({ code: 'gate' });
		await provePart(ours.ctx, tag, { how: 'bench test hot', passed: true });
		await movePart(ours.ctx, tag, { bin: 'K3-1' });
		expect(await now()).toMatchObject({ state: 'shelved', doubtful: false });
	});

	it('undone out of the red bin it is not doubtful', async () => {
		const { eventId } = await movePart(ours.ctx, tag, { bin: 'R1' });
		await undoPart(ours.ctx, eventId);
		expect(await now()).toMatchObject({ state: 'shelved', bin: 'K3-1', doubtful: false });
		await movePart(ours.ctx, tag, { bin: 'K3-2' });
	});
});

describe('holding', () => {
	it('is for a week when no date is said, and says by whom and since when', async () => {
		const counter = await ours.as('counter');
		const { until } = await holdPart(counter, tag, { for: 'job 1312' });
		expect(until).toEqual(days(7));
		await expect(holdPart(ours.ctx, tag, { for: 'somebody else' })).rejects.toMatchObject({
			code: 'taken',
			message: expect.stringContaining(
				'Held for job 1312 until Mar 21, 2026, by counter here since Mar 14, 2026.'
			)
		});
	});

	it('names the next one like it', async () => {
		await holdPart(ours.ctx, tag, { for: 'job 1' });
		const refused = await holdPart(ours.ctx, tag, { for: 'job 2' }).catch((fault) => fault.message);
		expect(refused).toMatch(/Next like it: [0-9A-Z]{5} in the box of D1\./);
	});

	it('ends at the end of the day in the shop, not before today', async () => {
		const { until } = await holdPart(ours.ctx, tag, { for: 'job 1', until: '2026-03-14' });
		expect(until).toEqual(new Date('2026-03-14T23:59:59Z'));
		await freePart(ours.ctx, tag);
		await expect(
			holdPart(ours.ctx, tag, { for: 'job 1', until: '2026-03-13' })
		).rejects.toMatchObject({ field: 'until' });
	});

	it('goes back where it was when let go, and by itself when its date is past', async () => {
		await holdPart(ours.ctx, tag, { for: 'job 1' });
		await freePart(ours.ctx, tag);
		expect(await now()).toMatchObject({ state: 'shelved', bin: 'K3-1', heldBy: null });
		await holdPart(ours.ctx, tag, { for: 'job 1' });
		await expireHolds(ours.ctx.db, ours.ctx.shopId, days(6));
		expect((await now()).state).toBe('held');
		await expireHolds(ours.ctx.db, ours.ctx.shopId, days(8));
		expect(await now()).toMatchObject({ state: 'shelved' });
		expect((await now()).history[0]!.said).toBe('The hold ran out');
	});

	it('that ran out does not keep the next one waiting for the sweep', async () => {
		await holdPart(ours.ctx, tag, { for: 'job 1' });
		await holdPart(ours.at(days(8)), tag, { for: 'job 2' });
		expect((await now()).heldBy).toBe('job 2');
	});

	it('of twenty who ask at once exactly one gets it', async () => {
		const asked = Array.from({ length: 20 }, (_, at) =>
			holdPart(ours.ctx, tag, { for: `caller ${at}` })
		);
		const answers = await Promise.allSettled(asked);
		const lost = answers.flatMap((one) => (one.status === 'rejected' ? [one.reason] : []));
		expect(lost).toHaveLength(19);
		expect(
			lost.every((one) => one.code === 'taken' && one.message.startsWith('Held for caller'))
		).toBe(true);
	});
});

describe('using and selling', () => {
	it('is fitted straight from the shelf', async () => {
		await fitPart(ours.ctx, tag, { job: 'job 1312' });
		expect(await now()).toMatchObject({
			state: 'out',
			outAs: 'fitted',
			bin: null,
			taken: expect.stringContaining('Fitted on job 1312 by Wenna Oke on Mar 14, 2026.')
		});
	});

	it('sold from a hold forgets the hold', async () => {
		await holdPart(ours.ctx, tag, { for: 'Brennick' });
		await sellPart(ours.ctx, tag, { cents: 1400, to: 'Brennick' });
		expect(await now()).toMatchObject({ outAs: 'sold', outCents: 1400, heldBy: null });
		await expect(sellPart(ours.ctx, tag, { cents: 1400 })).rejects.toMatchObject({
			code: 'taken',
			message: expect.stringContaining('Sold to Brennick by Wenna Oke on Mar 14, 2026.')
		});
	});

	it('a kind for this shop only is fitted, never sold', async () => {
		const own = {
			kind: 'govspring',
			grade: 'good used',
			checklist: checklist('govspring')
		} as const;
		const { tag } = await pullPart(ours.ctx, donor, own);
		await expect(sellPart(ours.ctx, tag, { cents: 500, to: 'x' })).rejects.toMatchObject({
			code: 'gate',
			message: expect.stringContaining('never sold')
		});
		await fitPart(ours.ctx, tag, { job: 'job 7' });
	});

	it('a kind for the trade is sold only with the name of who takes it', async () => {
		const wheel = {
			kind: 'flywheel',
			grade: 'good used',
			checklist: checklist('flywheel')
		} as const;
		const { tag } = await pullPart(ours.ctx, donor, wheel);
		await expect(sellPart(ours.ctx, tag, { cents: 5000 })).rejects.toMatchObject({ field: 'to' });
		await sellPart(ours.ctx, tag, { cents: 5000, to: 'Thrennick Mower Care' });
	});

	it('comes back into the red bin and to a shelf only after a passed test', async () => {
		await sellPart(ours.ctx, tag, { cents: 1400 });
		await takeBackPart(ours.ctx, tag, { reason: 'no spark when hot' });
		expect(await now()).toMatchObject({ state: 'back', bin: 'R1', doubtful: true, outAs: null });
		await expect(movePart(ours.ctx, tag, { bin: 'K3-1' })).rejects.toMatchObject({ code: 'gate' });
		await expect(sellPart(ours.ctx, tag, { cents: 1 })).rejects.toMatchObject({ code: 'gate' });
		await provePart(ours.ctx, tag, { how: 'bench test hot', passed: true });
		await movePart(ours.ctx, tag, { bin: 'K3-1' });
		expect(await now()).toMatchObject({ state: 'shelved', doubtful: false });
	});
});

describe('proving', () => {
	it('a failed test ends a hold and puts it into the red bin', async () => {
		await holdPart(ours.ctx, tag, { for: 'job 1' });
		await provePart(ours.ctx, tag, {
			how: 'bench test cold',
			figure: 3,
			unit: 'kV',
			passed: false
		});
		expect(await now()).toMatchObject({ state: 'back', bin: 'R1', heldBy: null, doubtful: true });
		expect((await now()).history[0]!.said).toBe('Bench test cold: failed, 3 kV');
	});
});

describe('grading and editing', () => {
	it('says both sides when somebody saved in between', async () => {
		const { version } = await now();
		await gradePart(ours.ctx, tag, { grade: 'usable', version });
		await expect(gradePart(ours.ctx, tag, { grade: 'clean used', version })).rejects.toMatchObject({
			code: 'changed',
			message: expect.stringMatching(/graded usable.*You typed clean used/)
		});
		await expect(editPart(ours.ctx, tag, { version, label: 'long lead' })).rejects.toMatchObject({
			message: expect.stringMatching(/label: nothing.*label: long lead/)
		});
	});

	it('changes only what was sent, and what it is found by', async () => {
		const { version } = await now();
		await editPart(ours.ctx, tag, { version, numbers: ['TN-44 O1'], note: 'small chip' });
		expect(await now()).toMatchObject({ numbers: ['TN-44 O1'], note: 'small chip', label: '' });
		const { rows } = await ours.ctx.db.transaction(async (tx) => {
			await tx.execute(`select set_config('endplay.shop', '${ours.ctx.shopId}', true)`);
			return tx.execute(`select number_keys, search_words from part where tag = '${tag}'`);
		});
		expect(rows[0]).toMatchObject({ number_keys: ['TN4401'] });
		expect(rows[0]!.search_words).toContain('small chip');
	});
});

describe('scrapping and going missing', () => {
	it('is the end, with the reason', async () => {
		await scrapPart(ours.ctx, tag, { reason: 'cracked', destroyed: true });
		await expect(holdPart(ours.ctx, tag, { for: 'x' })).rejects.toMatchObject({
			message: expect.stringContaining('Destroyed by Wenna Oke on Mar 14, 2026: cracked.')
		});
	});

	it('a safety part goes destroyed, with a picture of that taken now', async () => {
		const wheel = {
			kind: 'flywheel',
			grade: 'untested',
			checklist: checklist('flywheel')
		} as const;
		const { tag } = await pullPart(ours.ctx, donor, { ...wheel, checklist: [...wheel.checklist] });
		const kept = () => ({
			key: `1/${crypto.randomUUID()}`,
			width: 1,
			height: 1,
			bytes: 1,
			blur: ''
		});
		await hangPhoto(ours.at(days(-2)), tag, kept());
		const scrap = (destroyed: boolean) => scrapPart(ours.ctx, tag, { reason: 'crack', destroyed });
		await expect(scrap(false)).rejects.toMatchObject({ field: 'destroyed' });
		await expect(scrap(true)).rejects.toMatchObject({ field: 'file' });
		await hangPhoto(ours.ctx, tag, kept());
		await scrap(true);
		expect(await getPart(ours.ctx, tag)).toMatchObject({ state: 'scrapped', destroyed: true });
	});

	it('does not scrap what is out', async () => {
		await fitPart(ours.ctx, tag, { job: 'job 1' });
		await expect(scrapPart(ours.ctx, tag, { reason: 'x' })).rejects.toMatchObject({
			code: 'taken'
		});
	});

	it('turns up again where it belongs, a doubtful one in the red bin', async () => {
		await missPart(ours.ctx, tag);
		expect((await now()).taken).toContain('Missing, reported by Wenna Oke');
		await foundPart(ours.ctx, tag);
		expect(await now()).toMatchObject({ state: 'shelved', bin: 'K3-1' });
		await movePart(ours.ctx, tag, { bin: 'R1' });
		await missPart(ours.ctx, tag);
		await foundPart(ours.ctx, tag);
		expect(await now()).toMatchObject({ state: 'back', doubtful: true });
	});
});

describe('undoing', () => {
	it('takes back the newest change, whatever it was', async () => {
		const before = await now();
		const same = async () => {
			const { version: _, history: __, ...rest } = await now();
			const { version: ___, history: ____, ...was } = before;
			expect(rest).toEqual(was);
		};
		const verbs = [
			() => movePart(ours.ctx, tag, { bin: 'K3-2' }),
			() => holdPart(ours.ctx, tag, { for: 'job 1' }),
			() => sellPart(ours.ctx, tag, { cents: 5 }),
			() => fitPart(ours.ctx, tag, { job: 'j' }),
			() => scrapPart(ours.ctx, tag, { reason: 'r' }),
			() => missPart(ours.ctx, tag)
		];
		for (const verb of verbs) {
			await undoPart(ours.ctx, (await verb()).eventId);
			await same();
		}
	});

	it('puts a hold back with its date', async () => {
		await holdPart(ours.ctx, tag, { for: 'job 1', until: '2026-03-20' });
		const { eventId } = await freePart(ours.ctx, tag);
		await undoPart(ours.ctx, eventId);
		expect((await now()).heldUntil).toEqual(new Date('2026-03-20T23:59:59Z'));
	});

	it('refuses when something came after it, when it is old, and proofs', async () => {
		const { eventId } = await movePart(ours.ctx, tag, { bin: 'K3-2' });
		await expect(undoPart(ours.at(days(31)), eventId)).rejects.toMatchObject({ code: 'gate' });
		const proof = await provePart(ours.ctx, tag, { how: 'look-over', passed: true });
		await expect(undoPart(ours.ctx, eventId)).rejects.toMatchObject({ code: 'changed' });
		await expect(undoPart(ours.ctx, proof.eventId)).rejects.toMatchObject({ code: 'gate' });
		await expect(undoPart(theirs.ctx, eventId)).rejects.toMatchObject({ name: 'NotFound' });
	});
});

it('another shop sees the same as for a tag that never was', async () => {
	const unknown = await getPart(theirs.ctx, 'ZZZZZ').catch((fault) => fault);
	for (const verb of [
		() => getPart(theirs.ctx, tag),
		() => movePart(theirs.ctx, tag, { bin: 'K3-1' }),
		() => holdPart(theirs.ctx, tag, { for: 'x' }),
		() => sellPart(theirs.ctx, tag, { cents: 1 }),
		() => scrapPart(theirs.ctx, tag, { reason: 'x' })
	])
		await expect(verb()).rejects.toEqual(unknown);
});

it('the state of every part is the replay of its events', async () => {
	const all = await statesAndReplays(ours.ctx);
	expect(all.length).toBeGreaterThan(20);
	for (const { tag, state, replayed } of all) expect([tag, replayed]).toEqual([tag, state]);
	expect(new Set(all.map((one) => one.state)).size).toBeGreaterThan(4);
});
