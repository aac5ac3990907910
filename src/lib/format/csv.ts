/** A cell of a CSV. A spreadsheet would run what begins like a formula: an apostrophe keeps it text. */
function cell(text: string): string {
	const safe = /^[=+\-@\t\r]/.test(text) ? `'${text}` : text;
	return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}

/** One line of a CSV. */
export const csvLine = (cells: readonly string[]): string => `${cells.map(cell).join(',')}\r\n`;
