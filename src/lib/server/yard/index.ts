// Yard: what is left of a donor, its trip to the scrap buyer, used oil and old fuel, and the register of releases.
// Every change is written with who and when; what was wrong is put right by a further entry.
// Not for taking a donor apart (donors, parts), nor for the books of the shop (ledger).
export { finishStripping, getFinish } from './finish';
export { listRegister } from './register';
export { addScrapRun, takeBackScrapRun } from './scrap-run';
export { getScrapRun, listScrapRuns, readyForScrap } from './runs';
export { addWaste, correctWaste, listWaste } from './waste';
