// What the trade knows: kinds, causes of death, what is left of a part, cautions, everyday names.
// Not for what a shop has, charges or decides: its figures here are defaults that a shop edits.
// Imports nothing but itself.
export {
	ENGINE_CLASSES,
	findKind,
	FITTINGS,
	isKindId,
	kind,
	kinds,
	type EngineClass,
	type Fitting,
	type Kind,
	type Reuse
} from './kind';
export { CAUSES } from './causes.data';
export { causeSaid, chanceLevel, isCauseId, worseLevel, type CauseId, type Level } from './causes';
export {
	chanceGood,
	DEFAULT_CHANCES,
	type ChanceGood,
	type ChanceInput,
	type Chances,
	type ProofOdds,
	type Sureness
} from './chance';
export { DEFAULT_PROOF_ODDS, PROOF_HOWS, type Proof, type ProofHow } from './proofs';
export { kindsOn } from './donor-kinds';
export { accessOrder, minutesToPull, standsBefore } from './access';
export { isSafeToStore, SAFE_TICKS, type SafeTick } from './cautions';
export { checklist, DEFERRAL } from './checklist';
export { whyChance } from './why';
export { matchKinds, type KindMatch, type MatchedHow } from './find-kind';
export { kindWords } from './aliases';
export { findScrapClass, SCRAP_CLASSES, scrapCentsPerGram } from './scrap';
export {
	testFields,
	testsHot,
	testsInPlace,
	type InPlaceNow,
	type Limit,
	type Limits
} from './bench-test';
export { boundsSaid, outside, type TestField } from './bounds';
export { setOf } from './sets';
export {
	mayCrank,
	TRIAGE,
	triage,
	triageFor,
	type Suggestion,
	type TriageAnswers,
	type TriageCaution,
	type Triaged
} from './triage';
