// Tags: the one registry of codes in a shop; a code is given once, to a box, a part or a bin.
// It gives codes out, also blank ones in advance, and says what a code was given to; to a stranger at most whose it is.
// Not for: the box, part or bin itself (their rooms), printing (labels).
export { listBlanks, mintBlanks } from './blanks';
export { mintTag } from './mint';
export { findTag, type FoundTag } from './queries';
export { strangerWaits, tagOwner } from './stranger';
