import { db } from '../db';
import type { Task } from '../queue';
import { sendWaiting, type Sending } from './send';

export const tasks: Task[] = [
	{ name: 'customers.letter', run: (payload, now) => sendWaiting(db(), payload as Sending, now) }
];
