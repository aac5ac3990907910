import { db } from '../db';
import { allShopIds } from '../people';
import type { Task } from '../queue';
import { expireHolds } from './expire-holds';

export const tasks: Task[] = [
	{
		name: 'parts.expire-holds',
		cron: '*/5 * * * *',
		async run(_payload, now) {
			for (const shopId of await allShopIds(db())) await expireHolds(db(), shopId, now);
		}
	}
];
