import type { LabelOffer } from './label';
import type { ReadingState } from './reading-words';

/** What was read off one photo of a donor. */
export interface ReadingView {
	id: number;
	photoId: number;
	state: ReadingState;
	askedAt: string;
	/** The photo turned clockwise by so many degrees is how it was read; places are shares of that picture. */
	turn: number;
	/** The photo's own size. */
	width: number;
	height: number;
	offers: LabelOffer[];
	lines: string[];
}
