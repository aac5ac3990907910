// Parts: logged, moved, proved, held, sold, taken back and scrapped; the verdict on each; what a donor still carries.
// Every verb locks the part, asks the rules of $lib/parts and writes the event of what it did.
// Not for: looking for parts (find), what they cost new (prices), taking a donor in or apart (donors).
export { editPart } from './edit';
export { workOut } from './calculator';
export { chanceOn } from './chance-on';
export { choicesFor } from './choices';
export { expireHolds } from './expire-holds';
export { listFits, noteFit } from './fits';
export { gradePart } from './grade';
export { binsFor, recentFor, usualKinds } from './handy';
export { freePart, holdPart } from './hold';
export { partsByIds } from './items';
export { foundPart, missPart } from './missing';
export { movePart } from './move';
export { logOldStock } from './old-stock';
export { fitPart, sellPart } from './out';
export { firstPhotos } from './first-photos';
export { addPartPhoto, hangPhoto } from './photo';
export { planFor } from './plan';
export { provePart } from './prove';
export { pullPart } from './pull';
export { countDonorParts, listDonorParts } from './off-donor';
export { getPart } from './queries';
export { recentFigures } from './recent-figures';
export { scrapPart } from './scrap';
export { kindsStillOn } from './still-on';
export { takeBackPart } from './take-back';
export { whatItTaught } from './taught';
export { undoPart } from './undo';
export { kindVerdicts, partVerdicts } from './verdicts';
