// Labels: what stands on the tag of a part, the label of a box, the sign of a bin; printed at true size on what a shop has.
// Also the measures of a shop's own sheets, and whether strangers are told whose a tag is.
// Not for giving codes out (tags), nor for reading them (the front room scan).
export { getLabelSettings, resetStock, saveStock, sayWhose } from './settings';
export { toPrint } from './counts';
export { previewLabels } from './preview';
export { printLabels, printOutlines } from './print';
