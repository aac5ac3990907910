import { z } from 'zod';
import { MeasuresInput } from './measures';
import { STOCK_IDS, stockOf, type Measures } from './stocks';

const stock = z.enum(STOCK_IDS, { error: 'Choose which labels these are' });
const version = z.coerce.number({ error: 'Reload the page and save again' }).int();

/** A roll has one label to a page: its width and height are all there is to say. */
const asRoll = ({ width, height }: Pick<Measures, 'width' | 'height'>): Measures => ({
	...{ width, height, pageWidth: width, pageHeight: height },
	...{ across: 1, down: 1, left: 0, top: 0, pitchX: width, pitchY: height }
});

/** The measures of one stock as its form sends them; the paper of a sheet is what it is. */
export const StockForm = z
	.looseObject({ stock, version })
	.transform(({ stock, version, ...typed }, issues) => {
		const { measures: usual, sheet } = stockOf(stock);
		const { pageWidth, pageHeight } = usual;
		const whole = sheet
			? { ...typed, pageWidth, pageHeight }
			: { ...usual, pageWidth: 300, pageHeight: 300, ...typed };
		const read = MeasuresInput.safeParse(whole);
		if (!read.success) {
			for (const { path, message } of read.error.issues)
				issues.addIssue({ code: 'custom', path, message });
			return z.NEVER;
		}
		return { stock, version, measures: sheet ? read.data : asRoll(read.data) };
	});

export const ResetForm = z.object({ stock });
export const WhoseForm = z.object({
	whose: z.enum(['yes', 'no'], { error: 'Choose whether strangers are told' })
});
