// Codes that people read, write and type: tags with a check character.
// Not for handing tags out in a shop, nor for printing or scanning them.
// Imports nothing but itself.
export { checkCharacter } from './check-character';
export { isTag, makeTag, readTag, TAG_LENGTH, TAG_SYMBOLS, type TagReading } from './tag';
