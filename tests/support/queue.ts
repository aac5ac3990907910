import pg from 'pg';

/** What waits in the queue of this worker's database for a task, oldest first, as the worker's own role reads it. */
export async function queued<P>(task: string): Promise<P[]> {
	const client = new pg.Client({ connectionString: process.env.DATABASE_WORKER_URL });
	await client.connect();
	try {
		const { rows } = await client.query<{ payload: P }>(
			`select j.payload from graphile_worker._private_jobs j
			join graphile_worker._private_tasks t on t.id = j.task_id
			where t.identifier = $1 order by j.id`,
			[task]
		);
		return rows.map(({ payload }) => payload);
	} finally {
		await client.end();
	}
}
