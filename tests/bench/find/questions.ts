import { numberKey } from '../../../src/lib/codes/number';
import { kinds, matchKinds } from '../../../src/lib/trade';
import { wordsOf } from '../../../src/lib/trade/spelling';
import type { Tagged } from './load';
import { Random } from './random';
import { isHere, type World, type WorldPart, type WorldShop } from './world';

/** What is typed, and which parts of the shop are right answers. */
export interface Question {
	class: string;
	typed: string;
	right: number[];
	/** The one that must come first, where there is one. */
	best?: number[];
}

interface Setting {
	random: Random;
	world: World;
	shop: WorldShop;
	tags: Tagged;
	here: WorldPart[];
}

const idsOf = (parts: readonly WorldPart[]) => parts.map(({ id }) => id);
const familyOf = ({ world }: Setting, { family }: WorldPart) => world.catalogue.families[family]!;
const flip = (text: string) => text.replaceAll('0', 'o').replaceAll('1', 'I');

const fullNumbers = ({ here }: Setting) =>
	here.filter(({ number }) => numberKey(number).length >= 6);

/** Parts that carry a number, or one that takes its place. */
function withNumber({ here, world }: Setting, number: string): WorldPart[] {
	const keys = new Set([numberKey(number)]);
	for (
		let next = world.catalogue.replaced.get(number);
		next;
		next = world.catalogue.replaced.get(next)
	)
		keys.add(numberKey(next));
	return here.filter((part) => part.number && keys.has(numberKey(part.number)));
}

function exact(s: Setting): Question {
	const { number } = s.random.pick(fullNumbers(s));
	return { class: 'number', typed: number, right: idsOf(withNumber(s, number)) };
}

function mangled(s: Setting): Question {
	const { number } = s.random.pick(fullNumbers(s));
	const ways = [
		numberKey(number),
		flip(number),
		flip(numberKey(number).toLowerCase()),
		number.replace(/[-. ]/g, ' ')
	];
	return {
		class: 'number mangled',
		typed: s.random.pick(ways),
		right: idsOf(withNumber(s, number))
	};
}

const superseded = (s: Setting): Question | null => {
	const [old] = s.random.pick([...s.world.catalogue.replaced]);
	const right = idsOf(withNumber(s, old));
	return right.length === 0 ? null : { class: 'number superseded', typed: old, right };
};

function fragment(s: Setting, where: 'begins' | 'ends' | 'inside'): Question {
	const key = numberKey(s.random.pick(fullNumbers(s)).number);
	const length = Math.max(4, Math.min(key.length - 2, 5));
	const at = where === 'begins' ? 0 : where === 'ends' ? key.length - length : 1;
	const typed = key.slice(at, at + length);
	const fits = (part: WorldPart) => numberKey(part.number).includes(typed);
	const right = idsOf(s.here.filter((part) => part.number && fits(part)));
	return { class: `number ${where}`, typed: /\d/.test(typed) ? typed : key, right };
}

const modelQuestion = (s: Setting): Question => {
	const part = s.random.pick(s.here);
	const { model, maker } = familyOf(s, part);
	const kind = kinds.find(({ id }) => id === part.kind)!;
	const said = kind.name.split(/[,/(]/)[0]!.trim().toLowerCase();
	const typed = s.random.pick([
		`${said} ${model}`,
		`${model.toLowerCase()} ${said}`,
		`${maker} ${model} ${said}`
	]);
	const right = idsOf(s.here.filter((one) => one.kind === part.kind && one.family === part.family));
	return { class: 'kind and model', typed, right: kindsOf(said).includes(part.kind) ? right : [] };
};

/** The kinds that are called so, read off the trade's list itself. */
const kindsOf = (said: string) =>
	matchKinds(said)
		.filter(({ how }) => how !== 'near')
		.map(({ kind }) => kind.id);

const bare = (said: string) => wordsOf(said).join(' ');
/** Every kind that has this name, however many it has, a plural being none. */
const namedBy = (said: string) =>
	kinds.filter(({ alsoCalled, name }) =>
		[name, name.split(/[,/(]/)[0]!, ...alsoCalled].some((one) => bare(one) === bare(said))
	);

const alone = kinds.flatMap((kind) =>
	[kind.name.split(/[,/(]/)[0]!, ...kind.alsoCalled]
		.map((said) => said.toLowerCase().trim())
		.filter((said) => {
			return namedBy(said).length === 1 && said.length > 3;
		})
		.map((said) => ({ said, kind: kind.id }))
);

function called(s: Setting): Question {
	const { said, kind } = s.random.pick(alone);
	return {
		class: 'called',
		typed: said,
		right: idsOf(s.here.filter((part) => part.kind === kind))
	};
}

/** One slip of the finger: a letter lost, doubled, swapped or wrong; never the first. */
function slip(random: Random, word: string): string {
	const at = 1 + random.below(word.length - 2);
	const cut = [word.slice(0, at), word.slice(at)] as const;
	return random.pick([
		cut[0] + cut[1].slice(1),
		cut[0] + cut[1][0] + cut[1],
		cut[0] + (cut[1][1] ?? '') + cut[1][0] + cut[1].slice(2),
		cut[0] + random.letters(1).toLowerCase() + cut[1].slice(1)
	]);
}

const plainNames = kinds.flatMap(({ id, name }) => {
	const word = name.split(/[,/( ]/)[0]!.toLowerCase();
	return word.length >= 7 &&
		kinds.filter(
			(one) => one.name.toLowerCase().includes(word) || one.alsoCalled.join(' ').includes(word)
		).length === 1
		? [{ word, id }]
		: [];
});

function slipped(s: Setting): Question {
	const { word, id } = s.random.pick(plainNames);
	return {
		class: 'misspelt',
		typed: slip(s.random, word),
		right: idsOf(s.here.filter((part) => part.kind === id))
	};
}

function makerSlipped(s: Setting): Question {
	const { word, id } = s.random.pick(plainNames);
	const { maker } = familyOf(s, s.random.pick(s.here));
	const right = s.here.filter((part) => part.kind === id && familyOf(s, part).maker === maker);
	return {
		class: 'maker misspelt',
		typed: `${word} ${slip(s.random, maker.toLowerCase())}`,
		right: idsOf(right)
	};
}

function displaced(s: Setting): Question {
	const { word, id } = s.random.pick(plainNames);
	const { cc } = familyOf(s, s.random.pick(s.here.filter(({ donor }) => donor)));
	const right = s.here.filter(
		(part) => part.kind === id && part.donor && familyOf(s, part).cc === cc
	);
	return {
		class: 'displacement',
		typed: s.random.pick([`${word} ${cc}cc`, `${cc} cc ${word}`]),
		right: idsOf(right)
	};
}

const SAME: [string, string][] = [
	['hole 3/4 in', '3/4'],
	['hole 3/4 in', '0.75"'],
	['bore 1 in', 'one inch'],
	['bore 1 in', '25.4 mm'],
	['hole 25 mm', '25mm'],
	['shaft 7/8 in', '22.2 mm'],
	['pin 10 tooth', '10 teeth'],
	['spacing 42 mm', '42 mm'],
	['length 2 7/16 in', '2-7/16']
];

function sized(s: Setting): Question {
	const [written, asked] = s.random.pick(SAME);
	return {
		class: 'size',
		typed: `${asked} ${written.split(' ')[0]}`,
		right: idsOf(s.here.filter(({ note }) => note.includes(written)))
	};
}

function bin(s: Setting): Question {
	const at = s.random.below(s.shop.bins.length);
	const address = s.shop.bins[at]!;
	return {
		class: 'bin',
		typed: s.random.pick([address, address.toLowerCase()]),
		right: idsOf(s.here.filter((part) => part.bin === at))
	};
}

function offDonor(s: Setting): Question {
	const donor = s.random.pick(s.shop.donors);
	const number = `${donor.number}`.padStart(2, '0');
	const typed = s.random.pick([`anything off D${number}`, `d${donor.number}`]);
	return { class: 'donor', typed, right: idsOf(s.here.filter((part) => part.donor === donor)) };
}

function serial(s: Setting): Question {
	const donor = s.random.pick(s.here.filter((part) => part.donor)).donor!;
	const at = s.random.below(4);
	const known = donor.serial.slice(at, at + 8);
	const typed = known.slice(0, 4) + '?' + known.slice(5);
	return { class: 'serial', typed, right: idsOf(s.here.filter((part) => part.donor === donor)) };
}

function note(s: Setting): Question {
	const words = s.random
		.pick(s.here.filter(({ note }) => note.split(' ').length > 2))
		.note.split(' ')
		.filter((word) => /^[a-z]{4,}$/.test(word))
		.slice(0, 2);
	const has = (part: WorldPart) => words.every((word) => part.note.split(' ').includes(word));
	return {
		class: 'note',
		typed: words.join(' '),
		right:
			words.length < 2 || words.some((word) => kindsOf(word).length > 0)
				? []
				: idsOf(s.here.filter(has))
	};
}

const MONTHS = 'jan feb mar apr may jun jul aug sep oct nov dec'.split(' ');

function dated(s: Setting): Question {
	const part = s.random.pick(s.here.filter(({ donor }) => donor?.cause === 'thrown-rod'));
	const day = new Date(part.donor!.takenIn);
	const word = s.random.pick(plainNames.filter(({ id }) => s.here.some((one) => one.kind === id)));
	const month = (time: number) =>
		`${new Date(time).getUTCFullYear()} ${new Date(time).getUTCMonth()}`;
	const right = s.here.filter(
		(one) =>
			one.kind === word.id &&
			one.donor &&
			['thrown-rod', 'no-oil', 'broken-block', 'lean'].includes(one.donor.cause) &&
			month(one.donor.takenIn) === month(part.donor!.takenIn)
	);
	return {
		class: 'cause and month',
		typed: `${MONTHS[day.getUTCMonth()]} ${`${day.getUTCFullYear()}`.slice(2)} blown engine ${word.word}`,
		right: idsOf(right)
	};
}

function tag(s: Setting): Question {
	const part = s.random.pick(s.here);
	return { class: 'tag', typed: s.tags.parts.get(part.id)!.toLowerCase(), right: [part.id] };
}

function tagSlip(s: Setting): Question {
	const part = s.random.pick(s.here);
	const right = s.tags.parts.get(part.id)!;
	const at = s.random.below(right.length);
	return {
		class: 'tag with a slip',
		typed: right.slice(0, at) + s.random.letters(1, '23456789') + right.slice(at + 1),
		right: [part.id]
	};
}

function reordered(s: Setting): Question {
	const question = modelQuestion(s);
	return { ...question, class: 'any order', typed: question.typed.split(' ').reverse().join(' ') };
}

const none = (s: Setting): Question => ({
	class: 'none',
	typed: s.random.pick([
		`qx${s.random.letters(3)}zz${s.random.digits(5)}`,
		`${s.random.letters(9, 'qxzvjk')} ${s.random.letters(7, 'qxzvjk')}`,
		`${s.random.digits(13)}`
	]),
	right: []
});

const MAKERS: [(s: Setting) => Question | null, number][] = [
	[exact, 40],
	[mangled, 40],
	[superseded, 25],
	[(s) => fragment(s, 'begins'), 25],
	[(s) => fragment(s, 'ends'), 25],
	[(s) => fragment(s, 'inside'), 25],
	[modelQuestion, 40],
	[called, 40],
	[slipped, 25],
	[makerSlipped, 25],
	[displaced, 30],
	[sized, 20],
	[bin, 25],
	[offDonor, 20],
	[serial, 20],
	[note, 25],
	[dated, 15],
	[tag, 20],
	[tagSlip, 15],
	[reordered, 25],
	[none, 25]
];

/** About 550 questions for one shop; each but those of the last class has an answer. */
export function makeQuestions(
	world: World,
	shop: WorldShop,
	tags: Tagged,
	seed: number
): Question[] {
	const s: Setting = {
		random: new Random(seed),
		world,
		shop,
		tags,
		here: shop.parts.filter(isHere)
	};
	return MAKERS.flatMap(([make, count]) => {
		const made: Question[] = [];
		for (let tries = 0; made.length < count && tries < count * 60; tries += 1) {
			const question = make(s);
			if (question && (question.right.length > 0 || question.class === 'none')) made.push(question);
		}
		return made;
	});
}
