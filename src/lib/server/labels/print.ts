import type { LabelChoice } from '$lib/labels/choice';
import type { Label } from '$lib/labels/label';
import { layOut } from '$lib/labels/layout';
import { placesFor, placesOn, stockOf, type Stock, type StockId } from '$lib/labels/stocks';
import { NotFound } from '$lib/refusal';
import { scanAddress } from '$lib/tags/qr';
import type { Context } from '../context';
import { env } from '../env';
import { getShop } from '../people';
import { chosenTags } from './chosen';
import { addPage, drawNumber, drawOutline, drawPieces } from './draw';
import { labelsOf } from './facts';
import { bytesOfPdf, measureIn, openPdf } from './faces';
import { getLabelSettings } from './settings';

export interface Sheet {
	stock: Stock;
	first: number;
	addressOf: (code: string) => string;
}

/** Labels on their pages, at true size. */
export async function labelsPdf(
	labels: readonly Label[],
	{ stock, first, addressOf }: Sheet
): Promise<Buffer> {
	const pdf = openPdf('Labels');
	const whole = bytesOfPdf(pdf);
	const measure = measureIn(pdf);
	let pages = -1;
	placesFor(labels.length, first, stock.measures).forEach(({ page, x, y }, at) => {
		for (; pages < page; pages += 1) addPage(pdf, stock);
		const label = labels[at]!;
		if (stock.cut) drawOutline(pdf, stock, x, y);
		drawPieces(pdf, layOut(label, addressOf(label.code), stock.measures, measure), x, y);
	});
	pdf.end();
	return whole;
}

/** The address that a tag's code opens, on the host that the shop is reached by. */
export const addressesOf = async (ctx: Context): Promise<(code: string) => string> => {
	const { slug } = await getShop(ctx);
	return (code) => scanAddress(env().ORIGIN, slug, code);
};

/** The chosen labels as a PDF. */
export async function printLabels(
	ctx: Context,
	choice: LabelChoice,
	stock: StockId
): Promise<Buffer> {
	const labels = await labelsOf(ctx, await chosenTags(ctx, choice));
	if (labels.length === 0) throw new NotFound('Nothing of this shop carries these tags.');
	const { stocks } = await getLabelSettings(ctx);
	const each = labels.flatMap((label) => Array<Label>(choice.copies).fill(label));
	const sheet = { stock: stockOf(stock, stocks), first: choice.first };
	return labelsPdf(each, { ...sheet, addressOf: await addressesOf(ctx) });
}

/** Where the labels of a stock lie, numbered: to be printed on plain paper and held against a sheet. */
export async function printOutlines(ctx: Context, id: StockId): Promise<Buffer> {
	const stock = stockOf(id, (await getLabelSettings(ctx)).stocks);
	const pdf = openPdf('Where the labels lie');
	const whole = bytesOfPdf(pdf);
	addPage(pdf, stock);
	placesOn(stock.measures).forEach(({ x, y }, at) => {
		drawOutline(pdf, stock, x, y);
		drawNumber(pdf, at + 1, x, y);
	});
	pdf.end();
	return whole;
}
