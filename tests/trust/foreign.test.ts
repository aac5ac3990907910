import { beforeAll, describe, expect, it } from 'vitest';
import { NotFound } from '../../src/lib/refusal';
import { movePart } from '../../src/lib/server/parts';
import { DOORS, type Refs } from '../support/doors';
import { testShops, type TestShop } from '../support/shops';
import { CANARY, NOTHING, stock } from '../support/things';

let ours: TestShop;
let theirs: TestShop;
let foreign: Refs;
beforeAll(async () => {
	({ ours, theirs } = await testShops());
	foreign = await stock(theirs);
});

const naming = Object.entries(DOORS).filter(([, door]) => door.names);
const listing = Object.entries(DOORS).filter(([, door]) => !door.names && door.needs === 'see');
const caught = (work: Promise<unknown>) => work.catch((fault: unknown) => fault);

describe('what another shop has is not there, in the words of what never was', () => {
	it.each(naming)('%s', async (_, door) => {
		const asked = await caught(door.call(ours.ctx, foreign));
		const unknown = await caught(door.call(ours.ctx, NOTHING));
		expect(asked).toBeInstanceOf(NotFound);
		expect((asked as Error).message).toBe((unknown as Error).message);
	});

	it('as a place to move to neither', async () => {
		const { ours: other } = await testShops();
		const { part } = await stock(other);
		const to = async (bin: string) =>
			`${await caught(movePart(other.ctx, part, { bin }))}`.replace(bin, 'X');
		expect(await to(foreign.bin.replace('1', '7'))).toBe(await to('nowhere 9'));
		expect(await to(foreign.donor)).toBe(await to('nowhere 9'));
		expect(await to(foreign.donor)).toContain('There is no bin X');
	});
});

describe('no canary of another shop', () => {
	it.each(listing)('in %s', async (_, door) => {
		const said = await door.call(ours.ctx, foreign);
		expect(JSON.stringify(said) ?? '').not.toContain(CANARY);
	});

	it('though its own shop sees it everywhere', async () => {
		const sees = ['getDonor', 'getPart', 'getBin', 'getPrice', 'listDonors', 'listBins'];
		for (const name of [...sees, 'listPrices', 'partsByIds', 'findParts', 'listMakers']) {
			const said = await DOORS[name]!.call(theirs.ctx, foreign);
			expect(JSON.stringify(said), name).toContain(CANARY);
		}
	});
});
