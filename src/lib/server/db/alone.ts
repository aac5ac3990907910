import { DrizzleQueryError } from 'drizzle-orm';
import type { Refused } from '$lib/refusal';

const cause = (fault: unknown) =>
	(fault instanceof DrizzleQueryError ? fault.cause : fault) as
		{ code?: string; constraint?: string } | undefined;

/** The write of a row that must be alone under a unique index: the second of two at once is refused in words. */
export async function alone<T>(write: Promise<T>, index: string, taken: Refused): Promise<T> {
	try {
		return await write;
	} catch (fault) {
		const { code, constraint } = cause(fault) ?? {};
		throw code === '23505' && constraint === index ? taken : fault;
	}
}
