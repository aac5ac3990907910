/** The columns of the table, in their order. */
export const TABLE_COLUMNS = [
	...['kind', 'bin', 'tag', 'engine', 'label', 'reason', 'grade', 'state'],
	...['asked', 'copy', 'new', 'verdict']
];
const USUAL = TABLE_COLUMNS.filter((id) => id !== 'reason');

/** The columns that an address names, the part always among them; the usual ones where it names none. */
export function chosenColumns(named: string | undefined): string[] {
	const asked = (named ?? '').split('.');
	const known = TABLE_COLUMNS.filter((id) => id === 'kind' || asked.includes(id));
	return known.length > 1 ? known : USUAL;
}
