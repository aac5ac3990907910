import { json } from '@sveltejs/kit';
import { openApi } from './document';

let made: ReturnType<typeof openApi> | undefined;

/** Open to everybody: it tells how to ask, not what a shop has. */
export const GET = () => json((made ??= openApi()));
