import { eq } from 'drizzle-orm';
import { beforeAll, expect, it } from 'vitest';
import { inShop } from '../../src/lib/server/context';
import { event } from '../../src/lib/server/people/tables';
import { DOORS, type Refs } from '../support/doors';
import { testShops, type TestShop } from '../support/shops';
import { stock } from '../support/things';

/** A picture in the store or a bare row is no change that anybody sees. */
const NO_CHANGE = ['keepPhoto', 'savePhoto', 'addPhotoRow'];
/** One for the run and one for the donor that it closes. */
const SEVERAL: Record<string, number> = { addScrapRun: 2 };
const READS = /^(list|get|ready|count|export|draft)|^(lettersAbout|wantState|customerFile)$/;

let ours: TestShop;
let refs: Refs;
beforeAll(async () => {
	({ ours } = await testShops());
	refs = await stock(ours);
});

const events = () => inShop(ours.ctx, (tx) => tx.$count(event, eq(event.shopId, ours.ctx.shopId)));

it('every change that is done writes one event, one that is refused none', async () => {
	const done: string[] = [];
	for (const [name, door] of Object.entries(DOORS)) {
		if (door.needs.startsWith('see') || READS.test(name) || NO_CHANGE.includes(name)) continue;
		const before = await events();
		const ok = await door.call(ours.ctx, refs).then(
			() => true,
			() => false
		);
		expect(await events(), name).toBe(before + (ok ? (SEVERAL[name] ?? 1) : 0));
		if (ok) done.push(name);
	}
	expect(done.length).toBeGreaterThan(25);
});
