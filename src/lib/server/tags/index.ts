// Tags: the one registry of codes in a shop; a code is given once, to a box, a part or a bin.
// It gives codes out and says what a code was given to.
// Not for: the box, part or bin itself (their rooms), printing.
export { mintTag } from './mint';
export { findTag, type FoundTag } from './queries';
