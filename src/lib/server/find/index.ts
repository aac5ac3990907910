// Find: the answer to "do I have one?" from a tag, a number, a kind by any name, an engine, a bin or words.
// Not for changing anything, nor for what a part is worth (parts) or what donors are (donors).
// Reads every table of the shop and writes none.
export { findParts } from './find-parts';
