import { describe, expect, it } from 'vitest';
import { TakeLabel } from './label-form';

const sent = (over: Record<string, unknown>) =>
	TakeLabel.safeParse({ version: '3', reading: '7', ...over });
const problems = (over: Record<string, unknown>) =>
	sent(over).error?.issues.map(({ path, message }) => [path.join('.'), message]);

describe('what is taken over from a label', () => {
	it('is what was ticked, and what was typed beside it', () => {
		expect(
			sent({
				take: ['model'],
				own: ['serial', 'typeCode'],
				model: ' X1 ',
				serial: '7?',
				maker: 'A'
			}).data
		).toEqual({
			reading: 7,
			fields: ['model', 'serial'],
			edit: { version: 3, model: 'X1', serial: '7?' }
		});
	});

	it('may empty a field that is ticked', () => {
		expect(sent({ take: ['displacementCc', 'model'] }).data?.edit).toEqual({
			version: 3,
			displacementCc: null,
			model: ''
		});
	});

	it('has its displacement in cc, however it was said', () => {
		const cc = (displacementCc: string) =>
			sent({ take: ['displacementCc'], displacementCc }).data?.edit.displacementCc;
		expect(cc('210')).toBe(210);
		expect(cc('12.9 cu in')).toBe(211.4);
	});

	it('says what to do where something is missing', () => {
		expect(problems({})).toEqual([['take', 'Tick the lines that are right, then take them over.']]);
		expect(problems({ take: ['displacementCc'], displacementCc: 'big' })).toEqual([
			['displacementCc', 'Enter the displacement as a figure like 210, or 12.9 cu in']
		]);
		expect(problems({ take: ['emissionFamily'], emissionFamily: 'H'.repeat(30) })).toEqual([
			['emissionFamily', 'Keep the emission family under 24 characters']
		]);
	});
});
