import type { Context } from '../context';
import { listBins } from '../bins';
import { listBlanks } from '../tags';
import { todayTags } from './chosen';

/** What there is to print at the moment: logged today, blanks that wait, racks with signs. */
export async function toPrint(ctx: Context) {
	const bins = await listBins(ctx);
	return {
		today: (await todayTags(ctx)).length,
		blanks: (await listBlanks(ctx)).length,
		bins: bins.length,
		racks: [...new Set(bins.flatMap(({ rack }) => rack ?? []))]
	};
}
