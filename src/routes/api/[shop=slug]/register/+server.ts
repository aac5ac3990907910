import { read } from '$lib/server/people';
import { listRegister } from '$lib/server/yard';
import { registerAsked } from '$lib/yard/register-form';

export const GET = read('work', (ctx, { url }) => listRegister(ctx, registerAsked(url.searchParams)));
