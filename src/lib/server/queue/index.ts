import { Logger, parseCronItems, run, type Runner } from 'graphile-worker';
import { env } from '../env';
import { log, unnamed } from '../log';

export { enqueue } from './enqueue';

/** One kind of background work. It may run twice: its effect must be the same as once. */
export interface Task {
	name: string;
	/** When it runs by itself, as a crontab line's five fields. */
	cron?: string;
	run(payload: unknown, now: Date): Promise<void>;
}

/** A server that reloads its modules must not leave the runner of the old ones at work. */
const kept = globalThis as { endplayRunner?: Runner | undefined };

/** Starts working the queue inside this process; picked up within tens of milliseconds. */
export async function startQueue(tasks: Task[]): Promise<void> {
	await stopQueue();
	kept.endplayRunner = await run({
		connectionString: env().DATABASE_WORKER_URL,
		concurrency: 2,
		noHandleSignals: true,
		logger: quiet(),
		taskList: Object.fromEntries(
			tasks.map((task) => [task.name, (payload: unknown) => task.run(payload, new Date())])
		),
		parsedCronItems: parseCronItems(
			tasks.flatMap((task) =>
				task.cron ? [{ task: task.name, match: task.cron, identifier: task.name }] : []
			)
		)
	});
}

export async function stopQueue(): Promise<void> {
	const { endplayRunner } = kept;
	kept.endplayRunner = undefined;
	await endplayRunner?.stop();
}

const quiet = () =>
	new Logger(() => (level, message) => {
		if (level === 'error' || level === 'warning')
			log().warn({ message: unnamed(message) }, 'queue');
	});
