import { z } from 'zod';
import { db } from '../db';
import { allShopIds } from '../people';
import type { Task } from '../queue';
import { expireHolds } from './expire-holds';
import { followDonor } from './follow-donor';

const Changed = z.object({ shopId: z.number(), memberId: z.number(), donorId: z.number() });

export const tasks: Task[] = [
	{
		name: 'parts.expire-holds',
		cron: '*/5 * * * *',
		async run(_payload, now) {
			for (const shopId of await allShopIds(db())) await expireHolds(db(), shopId, now);
		}
	},
	{
		name: 'donors.changed',
		async run(payload, now) {
			const { donorId, ...who } = Changed.parse(payload);
			await followDonor({ db: db(), role: 'bench', now, ...who }, donorId);
		}
	}
];
