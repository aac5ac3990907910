import { expect, it } from 'vitest';
import { makeTag } from '../codes';
import { PhotoOf, readOf } from './photo-of';

const tag = makeTag(() => Math.floor(Math.random() * 2 ** 32));

it('a donor by its number, anything else by its tag', () => {
	expect(readOf(' d12 ')).toBe('D12');
	expect(readOf('12')).toBe('D12');
	expect(readOf(tag.toLowerCase())).toBe(tag);
	expect(readOf('K7')).toBeNull();
	expect(readOf('')).toBeNull();
});

it('says in words what is wanted', () => {
	const parsed = PhotoOf.safeParse({ of: 'zz' });
	expect(parsed.error?.issues[0]?.message).toMatch(/tag on it/);
	expect(PhotoOf.parse({ of: tag })).toEqual({ of: tag, shot: 'other' });
});
