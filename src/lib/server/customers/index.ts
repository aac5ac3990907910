// Customers: whom the shop sells to and asks for, how to reach them, and the letters that go to them.
// Deleting a customer takes name and reach away; what was sold stays in the books as "a customer".
// Not for: what they wait for (wants), what they are offered and buy (offers, sales), who works here (people).
export { addCustomer, knownCustomer } from './add';
export { editCustomer } from './edit';
export { eraseCustomer } from './erase';
export { exportCustomer, exportCustomers } from './export';
export { customerRow, getCustomer, listCustomers, type CustomerRow } from './queries';
export { lettersAbout, sendAgain, writeLetter, type NewLetter } from './letters';
export { letterSettings, saveLetterSettings, type LetterSettings } from './settings';
export { findLetter, startLetters, stopLetters } from './stop';
export { listTemplates, saveTemplate, templateFor } from './templates';
