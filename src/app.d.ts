import type { Context } from '$lib/server/context';
import type { Db } from '$lib/server/db';
import type { Role } from '$lib/people/role';
import type { Session } from '@auth/sveltekit';

declare global {
	namespace App {
		interface Error {
			message: string;
			id?: string;
		}
		interface Locals {
			/** For what is asked before a shop is known; inside one, the context carries it. */
			db: Db;
			auth(): Promise<Session | null>;
			/** Who is signed in, if anybody. */
			person: { id: string; name: string; email: string } | null;
			/** Set when the address names a shop that the person (or key) belongs to. */
			ctx: Context | null;
			shops: { slug: string; name: string; role: Role }[];
		}
	}
}

export {};
