import type { CustomerEdit } from '$lib/customers/input';
import { Refused } from '$lib/refusal';
import { inShop, type Context } from '../context';
import { allow, record } from '../people';
import { sameReach } from './add';
import { customerRow, ownCustomer } from './queries';
import { columnsOf } from './rows';
import { customer } from './tables';

const FIELDS = ['name', 'kind', 'phone', 'email', 'note'] as const;

/** Changes who somebody is and how to reach them; refused with both sides when somebody saved in between. */
export const editCustomer = (ctx: Context, id: number, input: CustomerEdit): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'trade');
		const row = await customerRow(tx, ctx, id, 'lock');
		const changed = FIELDS.filter((field) => row[field] !== input[field]);
		if (row.version !== input.version) {
			const both = changed.map((one) => `${one} is now “${row[one]}”, you typed “${input[one]}”`);
			throw new Refused(
				'changed',
				`Somebody saved this customer meanwhile: ${both.join('; ') || 'nothing that you typed differs'}. Look and save again.`
			);
		}
		const others = (await sameReach(tx, ctx, input)).filter((one) => one.id !== id);
		if (others[0] && (changed.includes('phone') || changed.includes('email')))
			throw new Refused('taken', `${others[0].name} has this number or address already.`, 'phone');
		// another address is another reader: whoever stopped the letters there did not stop them here
		const fresh = changed.includes('email') ? { lettersOffAt: null } : {};
		await tx
			.update(customer)
			.set({ ...columnsOf(input), ...fresh, version: row.version + 1 })
			.where(ownCustomer(ctx, id));
		await record(tx, ctx, {
			about: 'customer',
			aboutId: id,
			what: 'edited',
			detail: { changed }
		});
	});
