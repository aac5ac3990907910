import { readChoice } from '$lib/labels/choice';
import { printLabels, printOutlines } from '$lib/server/labels';
import { page } from '$lib/server/people';
import { STOCK_COOKIE, stockHere } from '$lib/labels/stock-here';
import type { RequestEvent } from './$types';

/** The viewer of a browser draws the file; nothing in it may load or run. */
const POLICY =
	"default-src 'none'; object-src 'self'; style-src 'unsafe-inline'; frame-ancestors 'none'";
const A_YEAR = 365 * 24 * 3600;

export const GET = page('see', async (ctx, { url, cookies }: RequestEvent) => {
	const { choice } = readChoice(url.searchParams);
	const stock = stockHere(choice, cookies);
	cookies.set(STOCK_COOKIE, stock, { path: '/', maxAge: A_YEAR });
	const outlines = url.searchParams.has('outlines');
	const pdf = outlines ? await printOutlines(ctx, stock) : await printLabels(ctx, choice, stock);
	return new Response(new Uint8Array(pdf), {
		headers: {
			'content-type': 'application/pdf',
			'content-disposition': `inline; filename="labels-${stock}.pdf"`,
			'cache-control': 'no-store',
			'content-security-policy': POLICY
		}
	});
});
