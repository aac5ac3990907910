import { may, whoMay, type Ability } from '$lib/people/role';
import { Refused } from '$lib/refusal';
import type { Context } from '../context';

/** Refuses in words when the member's role does not carry this ability. Doors and verbs both ask. */
export function allow(ctx: Context, ability: Ability): void {
	if (!may(ctx.role, ability))
		throw new Refused(
			'role',
			`Only ${whoMay(ability)} can do this. You are signed in as ${ctx.role}.`
		);
}
