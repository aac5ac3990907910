import { redirect } from '@sveltejs/kit';
import { page } from '$lib/server/people';

export const load = page('see', (_ctx, { params }) => redirect(303, `/${params.shop}/parts`));
