import { z } from 'zod';
import { db } from '../db';
import type { Task } from '../queue';
import { READ_LABEL } from './label-ask';
import { fillReading } from './label-work';

const Asked = z.object({ shopId: z.number(), memberId: z.number(), id: z.number() });

export const tasks: Task[] = [
	{
		name: READ_LABEL,
		async run(payload, now) {
			const { shopId, memberId, id } = Asked.parse(payload);
			await fillReading({ db: db(), shopId, memberId, role: 'bench', now }, id);
		}
	}
];
