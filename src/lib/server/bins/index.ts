// Bins: the places with an address, what each is for, and what is in it.
// The red bin is one of them.
// Not for moving parts (parts), nor for the boxes of donors (donors).
export { addBin } from './add';
export { editBin } from './edit';
export { findPlace, getBin, listBins, listRetiredBins, redBin, type BinRow } from './queries';
export { retireBin, useBinAgain } from './retire';
