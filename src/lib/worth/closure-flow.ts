/** A flow that proves how good the best closed set can be, and what each choice against it costs. */
export interface ClosureFlow {
	/** The greatest closed set's sum. */
	best: number;
	/** The least closed set that reaches it. */
	chosen: boolean[];
	/** What leaving each out costs at least. */
	costOut: Float64Array;
	/** What taking each costs at least. */
	costIn: Float64Array;
	/** Along each arc "a needs b": what taking b without a costs at least. */
	alongNeeds: number[][];
}

const NOISE = 1e-9;

/**
 * Finds the closed set of the greatest sum (everything needed by a member is a member) as a minimum
 * cut, by Dinic's method. In: what each needs, once; then profits, any sign, as often as wanted.
 * Source: Picard 1976, "Maximal Closure of a Graph and Applications to Combinatorial Problems".
 */
export function closureSolver(needs: readonly number[][]): (profits: Float64Array) => ClosureFlow {
	const count = needs.length;
	const source = count;
	const sink = count + 1;
	const to: number[] = [];
	const arcs: number[][] = Array.from({ length: count + 2 }, () => []);
	const link = (from: number, target: number) => {
		arcs[from]!.push(to.push(target) - 1);
		arcs[target]!.push(to.push(from) - 1);
		return to.length - 2;
	};
	const fromSource = needs.map((_needs, node) => link(source, node));
	const intoSink = needs.map((_needs, node) => link(node, sink));
	const needArcs = needs.map((list, node) => list.map((need) => link(node, need)));
	const room = new Float64Array(to.length);
	const level = new Int32Array(count + 2);
	const next = new Int32Array(count + 2);

	function layer(): boolean {
		level.fill(-1);
		level[source] = 0;
		const queue = [source];
		for (const node of queue) {
			for (const arc of arcs[node]!) {
				if (room[arc]! <= NOISE || level[to[arc]!]! >= 0) continue;
				level[to[arc]!] = level[node]! + 1;
				queue.push(to[arc]!);
			}
		}
		return level[sink]! >= 0;
	}

	function push(node: number, amount: number): number {
		if (node === sink) return amount;
		for (; next[node]! < arcs[node]!.length; next[node]! += 1) {
			const arc = arcs[node]![next[node]!]!;
			if (room[arc]! <= NOISE || level[to[arc]!] !== level[node]! + 1) continue;
			const sent = push(to[arc]!, Math.min(amount, room[arc]!));
			if (sent <= 0) continue;
			room[arc]! -= sent;
			room[arc ^ 1]! += sent;
			return sent;
		}
		return 0;
	}

	return (profits) => {
		room.fill(0);
		let best = 0;
		profits.forEach((profit, node) => {
			room[profit > 0 ? fromSource[node]! : intoSink[node]!] = Math.abs(profit);
			if (profit > 0) best += profit;
		});
		for (const list of needArcs) for (const arc of list) room[arc] = Infinity;
		while (layer()) {
			next.fill(0);
			for (let sent = push(source, Infinity); sent > 0; sent = push(source, Infinity)) best -= sent;
		}
		return {
			best,
			chosen: needs.map((_needs, node) => level[node]! >= 0),
			costOut: Float64Array.from(fromSource, (arc) => room[arc]!),
			costIn: Float64Array.from(intoSink, (arc) => room[arc]!),
			alongNeeds: needArcs.map((list) => list.map((arc) => room[arc + 1]!))
		};
	};
}
