// What a part is worth: used price, waiting, gain, the word of the verdict, when to stop cleaning.
// Not for prices or policy as the shop keeps them: plain figures come in, plain figures go out.
// Imports nothing but itself; amounts in cents, rates per year, minutes.
export { WorthError } from './worth-error';
export { yearlyToContinuous } from './rates';
export { usedPrice, type Step, type UsedPrice, type UsedPriceInput } from './used-price';
export { gain, type Gain } from './gain';
export type { GainInput } from './gain-input';
export type { Terms } from './values';
export { verdictWord, type VerdictWord } from './verdict';
export { keepCleaning, type Cleaning, type CleaningInput } from './cleaning';
