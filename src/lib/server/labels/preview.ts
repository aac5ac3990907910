import type { LabelChoice } from '$lib/labels/choice';
import { layOut } from '$lib/labels/layout';
import { stockOf, type StockId } from '$lib/labels/stocks';
import type { LabelPreview } from '$lib/labels/view';
import type { Context } from '../context';
import { chosenTags } from './chosen';
import { labelsOf } from './facts';
import { measureIn, openPdf } from './faces';
import { addressesOf } from './print';
import { getLabelSettings } from './settings';

/** How many labels are chosen of each sort, and the first of them as it will be printed. */
export async function previewLabels(
	ctx: Context,
	choice: LabelChoice,
	stock: StockId
): Promise<LabelPreview> {
	const labels = await labelsOf(ctx, await chosenTags(ctx, choice));
	const { stocks } = await getLabelSettings(ctx);
	const { measures } = stockOf(stock, stocks);
	const count = { part: 0, box: 0, bin: 0, blank: 0 };
	for (const { what } of labels) count[what] += 1;
	const [first] = labels;
	if (!first) return { count, codes: [], measures, pieces: [] };
	const pdf = openPdf('Preview');
	const measure = measureIn(pdf);
	const address = (await addressesOf(ctx))(first.code);
	const pieces = layOut(first, address, measures, measure).map((piece) =>
		piece.what === 'text' ? { ...piece, long: measure(piece.text, piece.face) * piece.size } : piece
	);
	return { count, codes: labels.map((label) => label.code), measures, pieces };
}
