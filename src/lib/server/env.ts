import { z } from 'zod';

const url = (what: string) =>
	z.string({ error: `${what} is not set` }).refine(URL.canParse, `${what} is no URL`);
const text = (what: string) => z.string({ error: `${what} is not set` }).min(1, `${what} is empty`);

const Env = z.object({
	ORIGIN: url('ORIGIN').transform((origin) => new URL(origin).origin),
	AUTH_SECRET: text('AUTH_SECRET').min(32, 'AUTH_SECRET has fewer than 32 characters'),
	DATABASE_URL: url('DATABASE_URL'),
	DATABASE_WORKER_URL: url('DATABASE_WORKER_URL'),
	DATABASE_POOL: z.coerce.number().int().min(1).max(200).default(12),
	S3_ENDPOINT: url('S3_ENDPOINT'),
	S3_ACCESS_KEY: text('S3_ACCESS_KEY'),
	S3_SECRET_KEY: text('S3_SECRET_KEY'),
	S3_BUCKET: z.string().default('endplay'),
	S3_REGION: z.string().default('us-east-1'),
	SMTP_URL: url('SMTP_URL'),
	MAIL_FROM: z.string().default('Endplay <post@endplay.example>'),
	LOG_LEVEL: z.enum(['debug', 'info', 'warn', 'error', 'silent']).default('info')
});

export type Env = z.infer<typeof Env>;

let read: Env | undefined;

/** The checked environment; throws one error that lists every fault. */
export function env(): Env {
	if (read) return read;
	const parsed = Env.safeParse(process.env);
	if (!parsed.success) {
		const faults = parsed.error.issues.map(
			(issue) => `  - ${issue.message} (${issue.path.join('.')})`
		);
		throw new Error(`The environment is not complete:\n${faults.join('\n')}`);
	}
	return (read = parsed.data);
}

/** Served over TLS? Then cookies get their strict name and browsers are told to stay on TLS. */
export const overTls = () => env().ORIGIN.startsWith('https:');
