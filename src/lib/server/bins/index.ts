// Bins: the places with an address, what each is for, how much room it has, and what is in it; racks made in one go.
// The red bin is one of them.
// Not for moving parts (parts), walking along the bins or merging them (walks), nor for the boxes of donors (donors).
export { addBin } from './add';
export { editBin } from './edit';
export { findPlace, redBin, type BinRow } from './find-place';
export { getBin, lastCounted, listBins, listRetiredBins } from './queries';
export { makeRack, type RackMade } from './rack';
export { retireBin, useBinAgain } from './retire';
export { shelves } from './room';
export { binEvent, recordUndone, undoBin } from './undo';
