import { lt, sql } from 'drizzle-orm';
import { db } from '../db';
import type { Task } from '../queue';
import { sendInviteLetter, type InviteLetter } from './letters/invite';
import { session, verificationToken } from './tables';

export const tasks: Task[] = [
	{ name: 'people.invite', run: (payload) => sendInviteLetter(payload as InviteLetter) },
	{
		name: 'people.sweep',
		cron: '17 * * * *',
		async run(_payload, now) {
			await db().delete(session).where(lt(session.expires, now));
			await db().delete(verificationToken).where(lt(verificationToken.expires, now));
			await db().execute(
				sql`delete from sign_in_try where wait_until < ${new Date(now.getTime() - 86_400_000)}`
			);
		}
	}
];
