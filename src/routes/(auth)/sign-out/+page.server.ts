import { signOut } from '$lib/server/people';
import { redirect } from '@sveltejs/kit';

/** Open to everybody. */
export const load = () => redirect(303, '/');

export const actions = { default: signOut };
