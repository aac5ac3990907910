import type { Label } from './label';
import type { Piece } from './piece';
import type { Measures } from './stocks';

/** A piece as a screen draws it: how long a text is on paper is said, since its face there is another. */
export type ShownPiece = Piece & { long?: number };

export interface LabelPreview {
	count: Record<Label['what'], number>;
	codes: string[];
	measures: Measures;
	/** The first label. */
	pieces: ShownPiece[];
}
