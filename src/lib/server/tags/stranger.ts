import { readTag } from '$lib/codes';
import { lt, sql } from 'drizzle-orm';
import { createHash } from 'node:crypto';
import type { Db } from '../db';
import { strangerScan } from './tables';

const A_MINUTE = 30;

/** The name of the shop that a tag belongs to, where the shop lets strangers know; else null, as for no tag at all. */
export async function tagOwner(db: Db, slug: string, typed: string): Promise<string | null> {
	const reading = readTag(typed);
	if (!('tag' in reading)) return null;
	const { rows } = await db.execute<{ name: string | null }>(
		sql`select tag_owner(${slug}, ${reading.tag}) as name`
	);
	return rows[0]?.name ?? null;
}

/**
 * Counts one more scan of somebody who is no member; 0 when it may be answered, else the seconds to wait. What is
 * kept is a print of the address they came from, for a minute.
 */
export async function strangerWaits(db: Db, address: string, now: Date): Promise<number> {
	const came = createHash('sha256').update(address).digest('base64url');
	const until = new Date(now.getTime() + 60_000);
	await db.delete(strangerScan).where(lt(strangerScan.until, now));
	const [row] = await db
		.insert(strangerScan)
		.values({ came, scans: 1, until })
		.onConflictDoUpdate({
			target: strangerScan.came,
			set: { scans: sql`${strangerScan.scans} + 1` }
		})
		.returning();
	if (row!.scans <= A_MINUTE) return 0;
	return Math.max(1, Math.ceil((row!.until.getTime() - now.getTime()) / 1000));
}
