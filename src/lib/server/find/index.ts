// Find: the answer to "do I have one?" from a tag, a number, a kind by any name, an engine, a size, a bin or words.
// Not for changing parts, nor for what a part is worth (parts) or what donors are (donors).
// Its rows of what parts are found by are kept by triggers; it writes only that somebody looked in vain.
export { exportParts } from './export-parts';
export { findParts } from './find-parts';
