import { describe, expect, it } from 'vitest';
import { date, dateTime, length, mass, money, percent, plural, shortMoney } from './index';

// thin and fixed spaces differ between versions of the locale data
const plain = (text: string) => text.replace(/\s/g, ' ');

describe('money', () => {
	it.each([
		['en-US', 'USD', '$1,234.56'],
		['en-CA', 'USD', 'US$1,234.56'],
		['de-DE', 'EUR', '1.234,56 €'],
		['fr-FR', 'EUR', '1 234,56 €'],
		['en-GB', 'GBP', '£1,234.56']
	])('in %s with %s', (locale, currency, said) => {
		expect(plain(money(123456, currency, locale))).toBe(said);
	});

	it('knows currencies without small coins', () => {
		expect(money(1234, 'JPY')).toBe('¥1,234');
	});

	it('shows what is below nil and nil itself', () => {
		expect(money(-120, 'USD')).toBe('-$1.20');
		expect(money(0, 'USD')).toBe('$0.00');
	});
});

describe('money where room is short', () => {
	it.each([
		['en-US', 'USD', 4600, '$46'],
		['en-US', 'USD', 4650, '$46.50'],
		['en-US', 'USD', -4600, '-$46'],
		['de-DE', 'EUR', 123400, '1.234 €'],
		['en-US', 'JPY', 1234, '¥1,234']
	])('in %s with %s, %d', (locale, currency, cents, said) => {
		expect(plain(shortMoney(cents, currency, locale))).toBe(said);
	});
});

describe('days and times', () => {
	const late = new Date('2026-03-01T03:30:00Z');

	it.each([
		['en-US', 'America/Toronto', 'Feb 28, 2026'],
		['en-GB', 'Europe/London', '1 Mar 2026'],
		['de-DE', 'Europe/Berlin', '01.03.2026'],
		['fr-FR', 'Europe/Paris', '1 mars 2026']
	])('in %s the day in %s', (locale, zone, said) => {
		expect(plain(date(late, zone, locale))).toBe(said);
	});

	it('keeps a bare day that day in any zone', () => {
		for (const zone of ['Pacific/Kiritimati', 'Pacific/Pago_Pago', 'UTC']) {
			expect(date('2026-03-01', zone)).toBe('Mar 1, 2026');
		}
	});

	it('says the time of the shop', () => {
		expect(plain(dateTime(late, 'America/Toronto'))).toBe('Feb 28, 2026, 10:30 PM');
		expect(plain(dateTime('2026-03-01T03:30:00Z', 'Europe/Berlin', 'de-DE'))).toBe(
			'01.03.2026, 04:30'
		);
	});
});

describe('sizes and counts', () => {
	it('says lengths both ways', () => {
		expect(length(19.05, 'inch')).toBe('3/4 in (19.05 mm)');
		expect(length(19.05, 'mm')).toBe('19.05 mm (3/4 in)');
	});

	it('says masses', () => {
		expect(plain(mass(420))).toBe('420 g');
		expect(plain(mass(3300))).toBe('3.3 kg');
		expect(plain(mass(999.6))).toBe('1 kg');
		expect(plain(mass(3300, 'de-DE'))).toBe('3,3 kg');
	});

	it('says shares and counts', () => {
		expect(percent(0.6)).toBe('60%');
		expect(percent(0.125, 'en-US', 1)).toBe('12.5%');
		expect(plain(percent(0.6, 'fr-FR'))).toBe('60 %');
		expect([0, 1, 2, 1200].map((n) => plural(n, 'part', 'parts'))).toEqual([
			...['0 parts', '1 part', '2 parts', '1,200 parts']
		]);
	});
});
