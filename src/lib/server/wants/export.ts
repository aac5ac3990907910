import type { CustomerView } from '$lib/customers/view';
import type { WantItem } from '$lib/wants/view';
import { inShop, type Context } from '../context';
import { exportCustomer } from '../customers';
import { listWants } from './list';

/** Everything that the shop holds of one customer, on their request. */
export const customerFile = (
	ctx: Context,
	id: number
): Promise<{ customer: CustomerView; wants: WantItem[] }> =>
	inShop(ctx, async (_tx, ctx) => ({
		customer: await exportCustomer(ctx, id),
		wants: (await listWants(ctx, { customer: id, limit: 100 })).items
	}));
