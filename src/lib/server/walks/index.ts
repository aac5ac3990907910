// Walks: rounds through the bins with parts in hand, to put away, fetch, count or purge; each a route whose stops are rows.
// Also what spans bins and their parts: merging bins, what lies in the red bins, what a shelf is worth.
// Not for one part alone (parts), nor for what a bin is (bins). What a stop does to a part is done by the part's own verbs.
export { allThere, answerStop } from './answer';
export { getWalk } from './get';
export { putStrayRight } from './here';
export { listWalks, walkChoices } from './list';
export { mergeBins, undoBinChange } from './merge';
export { redParts } from './red';
export { daysInBins, moneyInBins } from './shelf-money';
export { startWalk } from './start';
export { findStray } from './stray';
export { endWalk, reopenWalk, takeBackAnswer } from './take-back';
