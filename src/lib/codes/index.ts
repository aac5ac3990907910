// Codes that people read, write and type: tags with a check character, emission families.
// Not for handing tags out in a shop, nor for printing or scanning them.
// Imports nothing but itself.
export { checkCharacter } from './check-character';
export {
	familyDisplacements,
	familyYears,
	readEmissionFamily,
	type EmissionFamily,
	type EmissionFamilyReading
} from './emission-family';
export { isTag, makeTag, readTag, TAG_LENGTH, TAG_SYMBOLS, type TagReading } from './tag';
