import { sql } from 'drizzle-orm';
import type { Tx } from '../db';

/** Puts a job in the queue inside the caller's transaction: roll back, and the job never was. */
export async function enqueue(
	tx: Tx,
	task: string,
	payload: Record<string, unknown>,
	jobKey?: string
): Promise<void> {
	await tx.execute(
		sql`select enqueue(${task}, ${JSON.stringify(payload)}::json, ${jobKey ?? null})`
	);
}
