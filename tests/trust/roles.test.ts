import { beforeAll, describe, expect, it } from 'vitest';
import { may, ROLES } from '../../src/lib/people/role';
import type { Context } from '../../src/lib/server/context';
import { holdPart, logOldStock, sellPart, undoPart } from '../../src/lib/server/parts';
import { DOORS, unlisted } from '../support/doors';
import { testShops } from '../support/shops';
import { NOTHING } from '../support/things';

const as: Record<string, Context> = {};
beforeAll(async () => {
	const { ours } = await testShops();
	for (const role of ROLES) as[role] = await ours.as(role);
});

it('every function of a door is listed with who may use it', () => expect(unlisted()).toEqual([]));

/** What came of it: 'role' when the function itself refused the member. */
const outcome = (work: Promise<unknown>) =>
	work.then(
		() => 'done',
		(fault: { code?: string; name: string }) => fault.code ?? fault.name
	);

describe.each(ROLES)('the %s', (role) => {
	it.each(Object.entries(DOORS))('asks %s, whatever the route let through', async (_, door) => {
		const said = await outcome(door.call(as[role]!, NOTHING));
		if (may(role, door.needs)) expect(said).not.toBe('role');
		else expect(said).toBe('role');
	});
});

it('the bench takes back its own moves but not the sale of the counter', async () => {
	const { ours } = await testShops();
	const [bench, counter] = [await ours.as('bench'), await ours.as('counter')];
	const { tag } = await logOldStock(bench, { kind: 'coil', grade: 'usable' });
	const held = await holdPart(bench, tag, { for: 'Tamsin' });
	await undoPart(bench, held.eventId);
	const { eventId } = await sellPart(counter, tag, { cents: 900 });
	await expect(undoPart(bench, eventId)).rejects.toMatchObject({ code: 'role' });
	await undoPart(counter, eventId);
});
