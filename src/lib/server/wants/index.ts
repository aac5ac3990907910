// Wants: who waits for which part, what came in that answers it, whom it was told and what they said.
// Listens for parts and donors that come in; the verdict on a part reads from its tables that somebody waits.
// Not for: who the people are and how letters leave (customers), what they are offered and pay (offers, sales).
export { addWant, type Added } from './add';
export { closeWant, sayNo, sayYes, takeOffWant, waitOn } from './answer';
export { countFresh, countWants } from './count';
export { draftFor } from './draft';
export { editWant } from './edit';
export { customerFile } from './export';
export { getWant, wantState } from './get';
export { listWants, SHOWN, type Shown } from './list';
export { dropMatch, seeWant } from './look';
export { quietWants } from './quiet';
export { tellWant } from './tell';
export { undoWant } from './undo';
export { donorWanted, partWanted } from './wanted';
