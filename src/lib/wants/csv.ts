import { csvLine } from '../format/csv';
import type { CustomerView } from '../customers/view';
import type { WantItem } from './view';

const day = (at: Date | null) => at?.toISOString().slice(0, 10) ?? '';

type Reach = Pick<
	CustomerView,
	'name' | 'kind' | 'phone' | 'email' | 'note' | 'addedAt' | 'lettersOffAt'
>;

const HEADS = ['Name', 'What they are', 'Phone', 'E-mail', 'Note', 'Entered', 'Letters stopped'];

const reachLine = (one: Reach) =>
	csvLine([
		...[one.name, one.kind, one.phone, one.email, one.note],
		...[day(one.addedAt), day(one.lettersOffAt)]
	]);

/** Customers as a table for a spreadsheet. */
export const customersCsv = (all: readonly Reach[]): string =>
	csvLine(HEADS) + all.map(reachLine).join('');

/** Everything held of one customer: who they are, what they wait for, the letters that went to them. */
export function customerCsv(customer: CustomerView, wants: readonly WantItem[]): string {
	const waits = wants.map((one) =>
		csvLine([`W${one.number}`, one.what, one.state, day(one.addedAt), day(one.toldAt)])
	);
	const letters = customer.letters.map((one) =>
		csvLine([day(one.writtenAt), one.to, one.state, one.subject, one.text])
	);
	return [
		customersCsv([customer]),
		...['\r\n', csvLine(['Want', 'What', 'State', 'Entered', 'Told']), ...waits],
		...['\r\n', csvLine(['Letter of', 'To', 'State', 'Subject', 'Text']), ...letters]
	].join('');
}
