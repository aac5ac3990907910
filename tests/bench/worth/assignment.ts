/**
 * The greatest sum of weights when each row takes at most one column and each column at most one
 * row. In: weights of 0 or more (0: not possible), rows of equal length. Out: for each row its
 * column, or -1. Source: Kuhn 1955, "The Hungarian Method for the Assignment Problem".
 */
export function assign(weights: readonly (readonly number[])[]): number[] {
	const rows = weights.length;
	const columns = Math.max(rows, weights[0]?.length ?? 0);
	const cost = (row: number, column: number) => -(weights[row - 1]?.[column - 1] ?? 0);
	const rowPrice = new Float64Array(rows + 1);
	const columnPrice = new Float64Array(columns + 1);
	const rowOf = new Int32Array(columns + 1);
	const cameFrom = new Int32Array(columns + 1);
	for (let row = 1; row <= rows; row++) {
		rowOf[0] = row;
		const end = augment(0);
		for (let column = end; column !== 0;) {
			const before = cameFrom[column]!;
			rowOf[column] = rowOf[before]!;
			column = before;
		}
	}

	/** Grows the tree of tight edges until it meets a free column. */
	function augment(start: number): number {
		const slack = new Float64Array(columns + 1).fill(Infinity);
		const used = new Uint8Array(columns + 1);
		let column = start;
		while (rowOf[column] !== 0) {
			used[column] = 1;
			const row = rowOf[column]!;
			let least = Infinity;
			let next = 0;
			for (let other = 1; other <= columns; other++) {
				if (used[other]) continue;
				const reduced = cost(row, other) - rowPrice[row]! - columnPrice[other]!;
				if (reduced < slack[other]!) {
					slack[other] = reduced;
					cameFrom[other] = column;
				}
				if (slack[other]! < least) {
					least = slack[other]!;
					next = other;
				}
			}
			for (let other = 0; other <= columns; other++) {
				if (used[other]) {
					rowPrice[rowOf[other]!] = rowPrice[rowOf[other]!]! + least;
					columnPrice[other] = columnPrice[other]! - least;
				} else slack[other] = slack[other]! - least;
			}
			column = next;
		}
		return column;
	}

	const taken = new Array<number>(rows).fill(-1);
	for (let column = 1; column <= columns; column++) {
		const row = rowOf[column]! - 1;
		if (row >= 0 && (weights[row]?.[column - 1] ?? 0) > 0) taken[row] = column - 1;
	}
	return taken;
}
