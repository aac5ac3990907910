/** D12, d12 or 12: the number of a donor; null when it is not one (then it may be the tag of a box). */
export function donorNumber(typed: string): number | null {
	const found = /^d?([1-9]\d{0,8})$/i.exec(typed.trim());
	return found ? Number(found[1]) : null;
}

export const sayNumber = (number: number): string => `D${number}`;

/** The engine as it is said: maker and model, or that nobody has read it yet. */
export const sayEngine = ({ maker, model }: { maker: string; model: string }): string =>
	`${maker} ${model}`.trim() || 'Engine not read yet';
