import { change, read } from '$lib/server/people';
import { addWant, listWants, SHOWN, type Shown } from '$lib/server/wants';
import { WantInput } from '$lib/wants/input';

const isShown = (word: string | null): word is Shown => SHOWN.includes(word as Shown);

export const GET = read('trade', (ctx, { url }) => {
	const ask = (name: string) => url.searchParams.get(name) ?? undefined;
	const show = url.searchParams.get('show');
	return listWants(ctx, {
		shown: isShown(show) ? show : undefined,
		customer: Number(ask('customer')) || undefined,
		limit: Number(ask('limit')) || undefined,
		cursor: ask('cursor')
	});
});

export const POST = change('trade', WantInput, async (ctx, input) => {
	const { number, matches } = await addWant(ctx, input);
	return { status: 201, body: { number: `W${number}`, matches } };
});
