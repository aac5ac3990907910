import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import FlexSearch from 'flexsearch';
import MiniSearch, { type SearchOptions } from 'minisearch';
import { numberKey } from '../../../src/lib/codes/number';
import { tokensOf } from '../../../src/lib/donors/lexemes';
import { findKind } from '../../../src/lib/trade';
import type { Tagged } from './load';
import type { Question } from './questions';
import { scored, type Answered, type ClassScore } from './score';
import { isHere, type World, type WorldPart, type WorldShop } from './world';

export interface Peer {
	name: string;
	built: string;
	scores: ClassScore[];
}

interface Doc {
	id: number;
	text: string;
}

/** Everything about a part in one text: names and misspellings of its kind, numbers whole too, sizes in millimetres. */
function docOf({ catalogue }: World, shop: WorldShop, tags: Tagged, part: WorldPart): Doc {
	const kind = findKind(part.kind)!;
	const { maker, model, cc } = catalogue.families[part.family]!;
	const lexemes = tokensOf(part.note).map(({ lexeme }) => lexeme);
	const bin = part.bin === null ? '' : shop.bins[part.bin]!;
	const donor = part.donor ? `d${part.donor.number} ${part.donor.serial} ${part.donor.cause}` : '';
	const said = [
		kind.name,
		...kind.alsoCalled,
		maker,
		model,
		numberKey(model),
		`${cc}cc`,
		part.number,
		numberKey(part.number)
	];
	return {
		id: part.id,
		text: [...said, bin, numberKey(bin), tags.parts.get(part.id), donor, part.note, ...lexemes]
			.join(' ')
			.toLowerCase()
	};
}

/** The question in the same spelling. */
const askedOf = ({ typed }: Question): string => {
	const key = numberKey(typed);
	if (/\d/.test(key) && typed.split(' ').every((word) => /\d/.test(word) || word.length <= 4))
		return key.toLowerCase();
	return tokensOf(typed)
		.map(({ lexeme }) => lexeme)
		.join(' ')
		.toLowerCase();
};

function timed(questions: readonly Question[], ask: (asked: string) => number[]): Answered[][] {
	const once = (question: Question): Answered => {
		const began = performance.now();
		const ids = ask(askedOf(question));
		return { ids, total: ids.length, ms: performance.now() - began };
	};
	questions.slice(0, 40).forEach(once);
	return questions.map((question) => [once(question)]);
}

const seconds = (began: number) => `built in ${((performance.now() - began) / 1000).toFixed(1)} s`;

function mini(docs: readonly Doc[], questions: readonly Question[]): Peer {
	const began = performance.now();
	const index = new MiniSearch<Doc>({ fields: ['text'] });
	index.addAll(docs);
	const built = seconds(began);
	const options: SearchOptions = {
		prefix: true,
		fuzzy: (word: string) => (word.length > 4 ? 0.2 : false),
		combineWith: 'AND'
	};
	const ask = (asked: string) => index.search(asked, options).map(({ id }) => id as number);
	return { name: 'MiniSearch', built, scores: scored(questions, timed(questions, ask)) };
}

function flex(docs: readonly Doc[], questions: readonly Question[]): Peer {
	const began = performance.now();
	const index = new FlexSearch.Index({ tokenize: 'forward' });
	for (const { id, text } of docs) index.add(id, text);
	const built = seconds(began);
	const ask = (asked: string) => index.search(asked, { limit: 100 }) as number[];
	return { name: 'FlexSearch, forward', built, scores: scored(questions, timed(questions, ask)) };
}

const FTS5 = `
import json, sqlite3, sys, time
docs, asked = json.load(open(sys.argv[1])), json.load(open(sys.argv[2]))
began = time.perf_counter()
db = sqlite3.connect(':memory:')
db.execute("create virtual table f using fts5(text, tokenize='unicode61', prefix='3 4')")
db.executemany('insert into f(rowid, text) values (?, ?)', [(d['id'], d['text']) for d in docs])
built, out = time.perf_counter() - began, []
for words in asked:
    began = time.perf_counter()
    query = ' '.join('"' + w.replace('"', '') + '"*' for w in words.split())
    try:
        ids = [r[0] for r in db.execute('select rowid from f where f match ? order by rank limit 100', (query,))] if query else []
    except sqlite3.OperationalError:
        ids = []
    out.append([ids, (time.perf_counter() - began) * 1000])
print(json.dumps([built, out]))
`;

/** SQLite's own full text search, through Python where it is there. */
function fts5(docs: readonly Doc[], questions: readonly Question[]): Peer[] {
	const folder = mkdtempSync(join(tmpdir(), 'endplay-fts-'));
	try {
		const files = ['docs.json', 'asked.json', 'ask.py'].map((name) => join(folder, name));
		writeFileSync(files[0]!, JSON.stringify(docs));
		writeFileSync(files[1]!, JSON.stringify(questions.map(askedOf)));
		writeFileSync(files[2]!, FTS5);
		const said = execFileSync('python3', [files[2]!, files[0]!, files[1]!], {
			encoding: 'utf8',
			maxBuffer: 1 << 28
		});
		const [built, out] = JSON.parse(said) as [number, [number[], number][]];
		const answers = out.map(([ids, ms]) => [{ ids, total: ids.length, ms }]);
		return [
			{
				name: 'SQLite FTS5, prefix',
				built: `built in ${built.toFixed(1)} s`,
				scores: scored(questions, answers)
			}
		];
	} catch (fault) {
		process.stdout.write(`SQLite FTS5 is not to be had here: ${String(fault).slice(0, 120)}\n`);
		return [];
	} finally {
		rmSync(folder, { recursive: true, force: true });
	}
}

/** The same shop and questions, put to others, who get the same spelling and every name of each kind. */
export async function peers(
	shop: WorldShop,
	world: World,
	tags: Tagged,
	questions: readonly Question[]
): Promise<Peer[]> {
	const docs = shop.parts.filter(isHere).map((part) => docOf(world, shop, tags, part));
	return [mini(docs, questions), flex(docs, questions), ...fts5(docs, questions)];
}
