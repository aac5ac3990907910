import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
	CAUSES,
	isCauseId,
	testsInPlace,
	triage,
	TRIAGE,
	triageFor,
	type TriageAnswers
} from './index';
import { PROVED_BY } from './triage.data';

const oneOf = (id: string) =>
	fc.constantFrom(...TRIAGE.find((one) => one.id === id)!.answers.map((one) => one.id));
const answers: fc.Arbitrary<TriageAnswers> = fc.record(
	{
		plug: oneOf('plug'),
		oil: oneOf('oil'),
		turn: oneOf('turn'),
		thumb: oneOf('thumb'),
		spark: oneOf('spark'),
		signs: fc.uniqueArray(oneOf('signs'), { maxLength: 5 })
	},
	{ requiredKeys: [] }
);
const first = (given: TriageAnswers) => triage(given, 'R1').causes[0];

describe('the questions of the first minute', () => {
	it('name causes that there are, and each cause is proved by something', () => {
		for (const { answers } of TRIAGE)
			for (const { speaks } of answers)
				for (const { cause, weight } of speaks) {
					expect(isCauseId(cause), cause).toBe(true);
					expect([-2, -1, 1, 2, 3]).toContain(weight);
				}
		for (const { id } of CAUSES)
			if (id !== 'unknown') expect(PROVED_BY[id].length, id).toBeGreaterThan(5);
	});
	it('leave the dipstick out on a saw', () => {
		expect(triageFor('SA').map(({ id }) => id)).not.toContain('oil');
		expect(triageFor('R1').map(({ id }) => id)).toContain('oil');
	});
});

describe('what they suggest', () => {
	it('nothing, while nothing was looked at', () => {
		expect(triage({})).toEqual({ causes: [], cautions: [], mayCrank: false });
	});
	// common practice, no source: each row is one that a bench would name without thinking
	it.each([
		['no-oil', 'likely', { oil: 'empty', turn: 'solid' }],
		['thrown-rod', 'seen', { turn: 'clunk', signs: ['hole'] }],
		['water', 'likely', { oil: 'milky', turn: 'springy', signs: ['rust'] }],
		['stale-fuel', 'seen', { turn: 'free', thumb: 'puff', signs: ['chalk', 'sour'] }],
		['strike', 'seen', { signs: ['key'], turn: 'free' }],
		['overheated', 'likely', { signs: ['fins', 'tints'], plug: 'blistered' }],
		['overspeed', 'likely', { signs: ['holes', 'raced'] }],
		['retired', 'seen', { turn: 'free', thumb: 'puff', spark: 'good', signs: ['runs'] }],
		['electrical', 'likely', { turn: 'free', thumb: 'puff', spark: 'none' }]
	] as const)('%s, %s', (cause, sure, given) => {
		expect(first(given)).toMatchObject({ cause, sure });
	});
	it('a seized saw without oil in its fuel, not an engine that lost its oil', () => {
		const { causes } = triage({ turn: 'solid', oil: 'empty', plug: 'blistered' }, 'SA');
		expect(causes[0]).toMatchObject({ cause: 'lean', sure: 'likely' });
		expect(causes.map(({ cause }) => cause)).not.toContain('no-oil');
	});
	it('says what speaks against a cause', () => {
		const { causes } = triage({ oil: 'empty', turn: 'free', signs: ['tints'] }, 'R1');
		const noOil = causes.find(({ cause }) => cause === 'no-oil');
		expect(noOil).toMatchObject({ because: ['empty', 'blue or yellow heat tints'] });
		expect(noOil?.against).toEqual(['free and even']);
	});
	it('each with its reasons, no cause twice, whatever was answered; unknown words are not heard', () => {
		fc.assert(
			fc.property(answers, fc.constantFrom(null, 'R1', 'SA', 'GE'), (given, engine) => {
				const { causes } = triage(given, engine as 'R1');
				expect(new Set(causes.map(({ cause }) => cause)).size).toBe(causes.length);
				for (const { because, provedBy } of causes) {
					expect(because.length).toBeGreaterThan(0);
					expect(provedBy).not.toBe('');
				}
				expect(
					triage({ ...given, plug: 'nothing' }, engine as 'R1').causes.length
				).toBeLessThanOrEqual(causes.length);
			})
		);
	});
	it('a sign that proves a cause always puts it among the seen ones, before all others', () => {
		fc.assert(
			fc.property(answers, (given) => {
				const { causes } = triage({ ...given, signs: ['hole'] }, 'R1');
				expect(causes[0]).toMatchObject({ cause: 'thrown-rod', sure: 'seen' });
			})
		);
	});
});

describe('what must not be done', () => {
	it.each(['springy', 'solid', 'clunk', 'no-valves'])('a %s engine is not cranked', (turn) => {
		const { cautions, mayCrank } = triage({ turn });
		expect(mayCrank).toBe(false);
		expect(cautions[0]).toMatchObject({ id: 'do-not-crank' });
		expect(cautions[0]?.said).toMatch(/^Do not crank it/);
	});
	it('nothing is turned that was not turned free by hand, whatever else was seen', () => {
		fc.assert(
			fc.property(answers, (given) => {
				const tests = testsInPlace(['starter12', 'stator', 'eclutch', 'muffler', 'genhead'], given);
				expect(tests.map(({ kind }) => kind)).toEqual([
					'starter12',
					'stator',
					'eclutch',
					'genhead'
				]);
				for (const { turns, shut } of tests)
					if (turns && (given.turn !== 'free' || given.signs?.includes('hole')))
						expect(shut).not.toBeNull();
					else expect(shut).toBeNull();
			})
		);
	});
	it('tells to turn it first where nobody has', () => {
		expect(testsInPlace(['starter12'], {})[0]?.shut).toMatch(/by hand first/);
	});
	it('says that the flywheel of a raced engine is destroyed, once', () => {
		const { cautions } = triage({ signs: ['holes', 'raced'] });
		expect(cautions.filter(({ said }) => said.includes('flywheel is destroyed'))).toHaveLength(1);
	});
});
