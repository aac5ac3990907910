import { beforeAll, expect, it } from 'vitest';
import { bin, statesAndReplays } from '../../../../tests/support/bench';
import { testShops, type TestShop } from '../../../../tests/support/shops';
import { getPart, holdPart, logOldStock, provePart, putAway, undoParts } from '.';

let ours: TestShop;
let theirs: TestShop;
beforeAll(async () => {
	({ ours, theirs } = await testShops());
	await bin(ours.ctx, 'K1-1');
	await bin(ours.ctx, 'K1-2');
	await bin(theirs.ctx, 'Z9-9');
});

const coils = async (count: number, shop = ours) => {
	const tags: string[] = [];
	while (tags.length < count)
		tags.push((await logOldStock(shop.ctx, { kind: 'coil', grade: 'usable' })).tag);
	return tags;
};
const caught = (work: Promise<unknown>) => work.catch((fault: unknown) => fault);
const binsOf = async (tags: string[]) => {
	const bins = [];
	for (const tag of tags) bins.push((await getPart(ours.ctx, tag)).bin);
	return bins;
};

it('parts in hand go into one bin, each with an event of its own; one that lies there stays', async () => {
	const tags = await coils(3);
	await putAway(ours.ctx, { parts: [tags[0]!], bin: 'K1-1' });
	const done = await putAway(ours.ctx, { parts: [...tags, tags[1]!.toLowerCase()], bin: 'k1-1' });
	expect(done).toMatchObject({ to: 'K1-1', there: [tags[0]], refused: [] });
	expect(done.put.map((one) => one.tag).toSorted()).toEqual(tags.slice(1).toSorted());
	expect(await binsOf(tags)).toEqual(['K1-1', 'K1-1', 'K1-1']);
	for (const { state, replayed } of await statesAndReplays(ours.ctx)) expect(state).toBe(replayed);
});

it('what may not go there is said, and the others go', async () => {
	const [good, failed] = (await coils(2)) as [string, string];
	await provePart(ours.ctx, failed, { how: 'bench test cold', passed: false });
	const [foreign] = (await coils(1, theirs)) as [string];
	const { put, refused } = await putAway(ours.ctx, { parts: [failed, good, foreign], bin: 'K1-2' });
	expect(put.map((one) => one.tag)).toEqual([good]);
	expect(refused.map((one) => one.tag).toSorted()).toEqual([failed, foreign].toSorted());
	expect(refused.find((one) => one.tag === foreign)?.said).toBe('This is not here');
	expect(await binsOf([failed])).not.toEqual(['K1-2']);
});

it('a bin of another shop is as one that never was', async () => {
	const parts = await coils(1);
	const foreign = await caught(putAway(ours.ctx, { parts, bin: 'Z9-9' }));
	const unknown = await caught(putAway(ours.ctx, { parts, bin: 'Z9-8' }));
	expect(`${foreign}`.replace('Z9-9', 'X')).toBe(`${unknown}`.replace('Z9-8', 'X'));
	expect(foreign).toMatchObject({ code: 'bad input', field: 'bin' });
});

it('is taken back together, but not where something was done since', async () => {
	const tags = await coils(2);
	const { put } = await putAway(ours.ctx, { parts: tags, bin: 'K1-2' });
	const events = put.map((one) => one.eventId);
	await holdPart(ours.ctx, tags[0]!, { for: 'Tamsin' });
	expect(await undoParts(ours.ctx, { events })).toEqual({ undone: 1 });
	expect(await binsOf(tags)).toEqual(['K1-2', null]);
	expect(await caught(undoParts(ours.ctx, { events }))).toMatchObject({ code: 'changed' });
	expect(await caught(undoParts(theirs.ctx, { events }))).toMatchObject({ code: 'changed' });
});

it('two hands with the same parts do not wait for each other in a circle', async () => {
	const tags = await coils(12);
	const both = await Promise.all([
		putAway(ours.ctx, { parts: tags, bin: 'K1-1' }),
		putAway(ours.ctx, { parts: tags.toReversed(), bin: 'K1-2' })
	]);
	expect(both.map((done) => done.refused)).toEqual([[], []]);
	expect(new Set(await binsOf(tags)).size).toBe(1);
});
