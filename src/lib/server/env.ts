import { z } from 'zod';

const url = (what: string) =>
	z.string({ error: `${what} is not set` }).refine(URL.canParse, `${what} is no URL`);
const text = (what: string) => z.string({ error: `${what} is not set` }).min(1, `${what} is empty`);

const POOL = 'DATABASE_POOL is no whole number from 1 to 200';
const LEVELS = ['debug', 'info', 'warn', 'error', 'silent'] as const;

const Env = z.object({
	ORIGIN: url('ORIGIN').transform((origin) => new URL(origin).origin),
	AUTH_SECRET: text('AUTH_SECRET').min(32, 'AUTH_SECRET has fewer than 32 characters'),
	DATABASE_URL: url('DATABASE_URL'),
	DATABASE_WORKER_URL: url('DATABASE_WORKER_URL'),
	DATABASE_POOL: z.coerce.number(POOL).int(POOL).min(1, POOL).max(200, POOL).default(12),
	S3_ENDPOINT: url('S3_ENDPOINT'),
	S3_ACCESS_KEY: text('S3_ACCESS_KEY'),
	S3_SECRET_KEY: text('S3_SECRET_KEY'),
	S3_BUCKET: z.string().default('endplay'),
	S3_REGION: z.string().default('us-east-1'),
	SMTP_URL: url('SMTP_URL'),
	MAIL_FROM: z.string().default('Endplay <post@endplay.example>'),
	LOG_LEVEL: z.enum(LEVELS, `LOG_LEVEL is none of ${LEVELS.join(', ')}`).default('info')
});

export type Env = z.infer<typeof Env>;

let read: Env | undefined;

/** The checked environment; throws one error that lists every fault. */
export function env(): Env {
	if (read) return read;
	const parsed = Env.safeParse(process.env);
	if (!parsed.success) {
		const faults = parsed.error.issues.map((issue) => `  - ${issue.message}`);
		const fault = new Error(`Endplay does not start. Settings to correct:\n${faults.join('\n')}`);
		// Whoever starts it reads the list; where in the code it was found says nothing.
		fault.stack = fault.message;
		throw fault;
	}
	return (read = parsed.data);
}

/** Served over TLS? Then cookies get their strict name and browsers are told to stay on TLS. */
export const overTls = () => env().ORIGIN.startsWith('https:');
