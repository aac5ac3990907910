import type { FoundItem } from './view';

const amount = (cents: number | null) => (cents === null ? '' : (cents / 100).toFixed(2));

const COLUMNS: [string, (item: FoundItem) => string][] = [
	['Tag', (item) => item.tag],
	['Part', (item) => item.kindName],
	['Label', (item) => item.label],
	['Grade', (item) => item.grade],
	['State', (item) => item.state],
	['Bin', (item) => item.bin ?? ''],
	['Donor', (item) => item.donor ?? ''],
	['Engine', (item) => item.engine],
	['Asked', (item) => amount(item.askedCents)],
	['Copy', (item) => amount(item.copyCents)],
	['New', (item) => amount(item.newCents)],
	['Verdict', (item) => item.verdict ?? ''],
	['Held for', (item) => item.heldBy ?? ''],
	['Why', (item) => item.reason ?? '']
];

/** A cell of a CSV. A spreadsheet would run what begins like a formula: an apostrophe keeps it text. */
function cell(text: string): string {
	const safe = /^[=+\-@\t\r]/.test(text) ? `'${text}` : text;
	return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}

const row = (cells: string[]) => `${cells.map(cell).join(',')}\r\n`;

export const csvHead = (): string => row(COLUMNS.map(([head]) => head));
export const csvRow = (item: FoundItem): string => row(COLUMNS.map(([, text]) => text(item)));
