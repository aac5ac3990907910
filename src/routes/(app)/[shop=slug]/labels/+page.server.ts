import { choosesSomething, readChoice } from '$lib/labels/choice';
import { stockHere } from '$lib/labels/stock-here';
import { stockOf, STOCKS } from '$lib/labels/stocks';
import { getLabelSettings, previewLabels, toPrint } from '$lib/server/labels';
import { action, page } from '$lib/server/people';
import { mintBlanks } from '$lib/server/tags';
import { BlanksInput } from '$lib/tags/input';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('see', async (ctx, { url, params, cookies }: PageServerLoadEvent) => {
	const { choice, problems } = readChoice(url.searchParams);
	const stock = stockHere(choice, cookies);
	const { stocks } = await getLabelSettings(ctx);
	const chosen = choosesSomething(choice);
	const here = `/${params.shop}/labels`;
	return {
		choice,
		problems,
		stock: stockOf(stock, stocks),
		stocks: STOCKS.map(({ id, said, hint }) => ({
			value: id,
			label: said,
			hint: stocks[id] ? 'your own measures' : hint
		})),
		preview: chosen ? await previewLabels(ctx, choice, stock) : null,
		there: chosen ? null : await toPrint(ctx),
		back: chosen
			? { href: here, label: 'Labels' }
			: { href: `/${params.shop}/people`, label: 'More' }
	};
});

export const actions = {
	blanks: action('work', BlanksInput, async (ctx, input, { params }: RequestEvent) => {
		const { batch } = await mintBlanks(ctx, input);
		return { to: `/${params.shop}/labels?blanks=${batch}` };
	})
};
