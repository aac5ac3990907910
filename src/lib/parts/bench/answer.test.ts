import { describe, expect, it } from 'vitest';
import { kinds, setOf } from '$lib/trade';
import { Pull } from '../input';
import { GRADES } from '../words';
import { answerIn, answerSaid, BAD, keeps, readIn } from './answer';
import { BenchForm } from './form';

const SET = ['2 bolts', 'bracket'];
const answered = (fields: Record<string, unknown>) => {
	const read = answerIn({ kind: 'solenoid', ...fields }, SET);
	if ('problems' in read) throw new Error(JSON.stringify(read.problems));
	return read.answer;
};

describe('an answer at the bench', () => {
	it('kept: with its grade, how it was checked, what was read and what is missing', () => {
		expect(
			answered({
				...{ say: 'keep good used', how: 'bench test cold', 'read-drop': '0,15' },
				missing: 'bracket'
			})
		).toEqual({
			what: 'log',
			kind: 'solenoid',
			body: {
				...{ kind: 'solenoid', grade: 'good used', set: '2 bolts', setMissing: 'bracket' },
				proof: { how: 'bench test cold', passed: true, figures: { drop: 0.15 } }
			}
		});
	});
	it('unchecked: no proof, and the set whole', () => {
		expect(answered({ say: 'keep untested' })).toMatchObject({
			body: { grade: 'untested', set: '2 bolts, bracket', setMissing: '' }
		});
		expect(answered({ say: 'keep untested' })).not.toHaveProperty('body.proof');
	});
	it('tried in place: the figure goes with it', () => {
		const tried = { how: 'worked in place', figure: '18', unit: 'A' };
		expect(answered({ say: 'keep good used', ...tried })).toMatchObject({
			body: { proof: { how: 'worked in place', passed: true, figure: 18, unit: 'A' } }
		});
	});
	it('bad: to scrap with its reason, destroyed, to the red bin, to rebuild', () => {
		expect(answered({ say: 'scrap worn' })).toMatchObject({
			body: { scrapped: { reason: 'worn' } }
		});
		expect(answered({ say: 'destroy' })).toMatchObject({ body: { scrapped: { destroyed: true } } });
		expect(answered({ say: 'red bin' })).toMatchObject({
			body: { grade: 'untested', proof: { how: 'bench test cold', passed: false } }
		});
		expect(answered({ say: 'red bin', how: 'worked in place' })).toMatchObject({
			body: { proof: { how: 'worked in place', passed: false } }
		});
		expect(answered({ say: 'core', how: 'look-over' })).not.toHaveProperty('body.proof');
	});
	it('left on: nothing is logged', () => {
		expect(answered({ say: 'leave' })).toEqual({ what: 'leave', kind: 'solenoid' });
	});
	it('every button of every kind is one that the server takes', () => {
		const said = [
			...[...GRADES.map((grade) => `keep ${grade}`), 'destroy', 'red bin', 'core'],
			...BAD.map((reason) => `scrap ${reason}`)
		];
		for (const { id } of kinds)
			for (const say of said) {
				const read = answerIn({ kind: id, say }, setOf(id));
				if (!('answer' in read) || read.answer.what !== 'log') throw new Error(`${id} ${say}`);
				expect(Pull.safeParse(read.answer.body).success, `${id} ${say}`).toBe(true);
			}
	});
	it('says what cannot be read', () => {
		expect(answerIn({ kind: 'coil', say: 'keep usable', 'read-spark': 'long' }, [])).toEqual({
			problems: [{ field: 'read-spark', message: 'Enter each figure as a number, like 18 or 18.5' }]
		});
		expect(answerIn({ kind: 'coil', say: 'keep it' }, [])).toHaveProperty('problems');
		expect(BenchForm.safeParse({ kind: 'nothing', say: 'leave' }).success).toBe(false);
		expect(BenchForm.safeParse({ kind: 'coil' }).error?.issues[0]?.message).toMatch(/^Choose kept/);
	});
	it('is said in a few words, and knows whether it makes stock', () => {
		const said = (say: string) => answerSaid(answered({ say }));
		expect(['keep usable', 'scrap bent', 'destroy', 'red bin', 'leave'].map(said)).toEqual([
			...['kept, usable', 'to scrap: bent', 'destroyed', 'failed: red bin', 'left on']
		]);
		expect(keeps(answered({ say: 'core' }))).toBe(true);
		expect(keeps(answered({ say: 'scrap bent' }))).toBe(false);
		expect(keeps(answered({ say: 'leave' }))).toBe(false);
	});
	it('reads figures by the field of the test', () => {
		expect(readIn({ 'read-coil': '3.1', 'read-gap': '', how: 'x' })).toEqual({ coil: 3.1 });
		expect(readIn({ how: 'x' })).toBeUndefined();
	});
});
