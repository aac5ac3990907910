import { db } from '../db';
import { allShopIds } from '../people';
import type { Task } from '../queue';
import { forgetCustomer } from './erased';
import { lookAgain, takeNotice, type Incoming } from './incoming';
import { quietWants } from './quiet';

export const tasks: Task[] = [
	{ name: 'parts.came-in', run: (payload, now) => takeNotice(db(), payload as Incoming, now) },
	{ name: 'donors.came-in', run: (payload, now) => takeNotice(db(), payload as Incoming, now) },
	{
		name: 'wants.match',
		run: (payload, now) => lookAgain(db(), payload as Parameters<typeof lookAgain>[1], now)
	},
	{
		name: 'customers.erased',
		run: (payload) => forgetCustomer(db(), payload as Parameters<typeof forgetCustomer>[1])
	},
	{
		name: 'wants.quiet',
		cron: '41 * * * *',
		async run(_payload, now) {
			for (const shopId of await allShopIds(db())) await quietWants(db(), shopId, now);
		}
	}
];
