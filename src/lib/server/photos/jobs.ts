import { db } from '../db';
import { log } from '../log';
import { allShopIds } from '../people';
import type { Task } from '../queue';
import { sweepPhotos } from './sweep';

const sweep: Task = {
	name: 'photos.sweep',
	cron: '17 * * * *',
	async run(_payload, now) {
		for (const shopId of await allShopIds(db())) {
			const ctx = { db: db(), shopId, memberId: 0, role: 'owner' as const, now };
			const removed = await sweepPhotos(ctx);
			if (removed > 0) log().info({ shopId, removed }, 'photos without a row were swept');
		}
	}
};

export const tasks: Task[] = [sweep];
