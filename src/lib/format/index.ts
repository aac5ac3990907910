// Figures made readable for people: money, days, sizes, counts.
// Not for arithmetic: what comes in is already decided and rounded.
// Uses the pure rooms only; the shop's currency, time zone and units are handed in.
export { money, percent, shortMoney } from './money';
export { date, dateTime } from './date';
export { length, mass } from './size';
export { plural } from './plural';
