import type { Snippet } from 'svelte';

/** A column of a DataTable: what it says is `text`, or a snippet when it is more than words. */
export interface Column<Row> {
	id: string;
	head: string;
	text?: (row: Row) => string;
	cell?: Snippet<[Row]>;
	/** A figure: fixed-width and to the right. */
	figure?: boolean;
	/** The head becomes a link that sorts. */
	sort?: boolean;
	/** The row is named by this column. */
	lead?: boolean;
}
