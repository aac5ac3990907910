// What a part is worth: used price, waiting, gain, the word of the verdict, when to stop cleaning,
// what to pull, what to do with a donor, what each part cost, and how the figures are learned.
// Not for prices or policy as the shop keeps them: plain figures come in, plain figures go out.
// Imports nothing but itself; amounts in cents, rates per year, minutes.
export { WorthError } from './worth-error';
export { yearlyToContinuous } from './rates';
export { usedPrice, type Step, type UsedPrice, type UsedPriceInput } from './used-price';
export { ownUse, type OwnUseInput } from './own-use';
export { gain, gainCents, type Gain } from './gain';
export type { GainInput } from './gain-input';
export type { Terms } from './values';
export { verdictWord, type VerdictWord } from './verdict';
export { keepCleaning, type Cleaning, type CleaningInput } from './cleaning';
export { learnChance, type ChanceToLearn } from './learn-chance';
export { learnRate, type RateToLearn } from './learn-rate';
export { learnShare, type ShareToLearn, type SharesSeen } from './learn-share';
export type { Learned, MeanPrior } from './learn-input';
export { pulledOnCall, type ParkedInput } from './park';
export { reach, type Waiting } from './waiting';
export { pullPlan, type PullPlan, type PullStep } from './pull-plan';
export type { PullInput, PullPart } from './pull-input';
export { decide, type ChoiceName, type Decision, type Tip } from './decide';
export type { DecisionInput } from './decide-input';
export { allocate, carry, type Allocation, type PartToCost, type Shares } from './allocate';
