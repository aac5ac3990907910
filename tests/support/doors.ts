import { Buffer } from 'node:buffer';
import { BinInput, RackInput } from '../../src/lib/bins/input';
import { ReleaseInput } from '../../src/lib/donors/input';
import type { Ability } from '../../src/lib/people/role';
import * as bins from '../../src/lib/server/bins';
import type { Context } from '../../src/lib/server/context';
import * as customers from '../../src/lib/server/customers';
import * as donors from '../../src/lib/server/donors';
import { exportParts, findParts } from '../../src/lib/server/find';
import * as labels from '../../src/lib/server/labels';
import * as parts from '../../src/lib/server/parts';
import * as people from '../../src/lib/server/people';
import * as photos from '../../src/lib/server/photos';
import * as prices from '../../src/lib/server/prices';
import * as tags from '../../src/lib/server/tags';
import { readChoice } from '../../src/lib/labels/choice';
import { stockOf } from '../../src/lib/labels/stocks';
import * as wants from '../../src/lib/server/wants';
import * as yard from '../../src/lib/server/yard';
import { ScrapRun, WasteEntry } from '../../src/lib/yard/input';
import * as walks from '../../src/lib/server/walks';
import { CustomerInput } from '../../src/lib/customers/input';
import { readQuestion } from '../../src/lib/find/input';

/** What a caller may name: one of each thing. */
export interface Refs {
	donor: string;
	donorId: number;
	part: string;
	partId: number;
	bin: string;
	retiredBin: string;
	price: number;
	photo: number;
	member: number;
	invite: number;
	key: number;
	partEvent: number;
	scrapRun: number;
	waste: number;
	pin: number;
	pinEvent: number;
	priceEvent: number;
	binEvent: number;
	walk: number;
	reading: number;
	takeEvent: number;
	customer: number;
	letter: number;
	want: string;
	wantMatch: number;
	wantEvent: number;
}

export interface Door {
	needs: Ability;
	/** Names a thing that must be there. */
	names: boolean;
	call(ctx: Context, refs: Refs): Promise<unknown>;
}

type Call = Door['call'];
const on = (needs: Ability, call: Call): Door => ({ needs, names: true, call });
const off = (needs: Ability, call: Call): Door => ({ needs, names: false, call });

const kept = { key: '1/none', width: 1, height: 1, bytes: 1, blur: '' };
const bin = BinInput.parse({ address: 'Q1-1', size: 'm' });
const PRICE = {
	kind: 'carb-float',
	engine: 'Ondrake TARN-21L',
	newCents: 4000,
	source: 'list',
	seenOn: '2026-03-01'
};
const ENDS = { x1: 0.1, y1: 0.1, x2: 0.6, y2: 0.1 };
const OLD = { kind: 'carb-float', grade: 'usable' as const };
const CALCULATION = {
	kind: 'carb-float',
	cause: 'stale-fuel' as const,
	grade: 'untested' as const,
	newCents: 4000,
	copyCents: null,
	have: 0,
	stillOn: false,
	season: null
};
const CUSTOMER = CustomerInput.parse({ name: 'Tamsin Oke', phone: '555 0177' });
const SETTINGS = { replyTo: '', tellByItself: false, quietDays: 9, version: 0 };
const LETTER = { name: 'part' as const, subject: 'Here', text: 'It is here.', version: 0 };
const SCRAP_RUN = {
	buyer: 'Scrap Yard',
	loads: [{ scrapClass: 'Al-Fe', grams: 9000, cents: 300 }]
};
const WASTE = WasteEntry.parse({ what: 'used oil', way: 'in', millilitres: 600 });
const SHOP = {
	name: 'Ours',
	currency: 'USD',
	timeZone: 'UTC',
	units: 'inch' as const,
	season: 'normal' as const,
	version: 1
};

const labelsOf = ({ part }: Refs) => readChoice(new URLSearchParams({ tag: part })).choice;

/** Every function by which a back room is entered for a member: who may, and whether it names something. */
export const DOORS: Record<string, Door> = {
	// people
	getShop: off('see', people.getShop),
	getPolicy: off('see', people.getPolicy),
	getPolicyRow: off('see', people.getPolicyRow),
	listMembers: off('run', people.listMembers),
	listInvites: off('run', people.listInvites),
	addKey: off('run', (ctx) => people.addKey(ctx, { name: 'k', role: 'reader' })),
	revokeKey: on('run', (ctx, { key }) => people.revokeKey(ctx, key)),
	inviteMember: off('run', (ctx) =>
		people.inviteMember(ctx, { email: 'a@mail.example', role: 'bench' })
	),
	withdrawInvite: on('run', (ctx, { invite }) => people.withdrawInvite(ctx, invite)),
	editMember: on('run', (ctx, { member }) =>
		people.editMember(ctx, { memberId: member, version: 1, role: 'reader' })
	),
	editPolicy: off('run', (ctx) => people.editPolicy(ctx, { own: {}, version: 0 })),
	editShop: off('run', (ctx) => people.editShop(ctx, SHOP)),
	setSeason: off('run', (ctx) => people.setSeason(ctx, 'rush')),
	// photos
	readPhoto: on('see', (ctx, { photo }) => photos.readPhoto(ctx, photo, 'card')),
	keepPhoto: off('work', (ctx) => photos.keepPhoto(ctx, Buffer.alloc(0))),
	savePhoto: off('work', (ctx) => photos.savePhoto(ctx, Buffer.alloc(0))),
	addPhotoRow: off('work', (ctx) => photos.addPhotoRow(ctx, { ...kept, key: crypto.randomUUID() })),
	deletePhoto: on('work', (ctx, { photo }) => photos.deletePhoto(ctx, photo)),
	restorePhoto: on('work', (ctx, { photo }) => photos.restorePhoto(ctx, photo)),
	// bins
	listBins: off('see', bins.listBins),
	listRetiredBins: off('see', bins.listRetiredBins),
	getBin: on('see', (ctx, refs) => bins.getBin(ctx, refs.bin)),
	addBin: off('work', (ctx) => bins.addBin(ctx, bin)),
	editBin: on('work', (ctx, refs) => bins.editBin(ctx, refs.bin, { ...bin, version: 1 })),
	retireBin: on('work', (ctx, refs) => bins.retireBin(ctx, refs.bin)),
	useBinAgain: on('work', (ctx, refs) => bins.useBinAgain(ctx, refs.retiredBin)),
	makeRack: off('work', (ctx) =>
		bins.makeRack(ctx, RackInput.parse({ rack: 'QR', shelves: 1, slots: 1, size: 's' }))
	),
	// donors
	listDonors: off('see', (ctx) => donors.listDonors(ctx)),
	listMakers: off('see', donors.listMakers),
	todayIn: off('see', donors.todayIn),
	getDonor: on('see', (ctx, { donor }) => donors.getDonor(ctx, donor)),
	takeIn: off('work', (ctx) => donors.takeIn(ctx, { model: 'TARN-21L' })),
	addBox: on('work', (ctx, { donor }) => donors.addBox(ctx, donor)),
	editDonor: on('work', (ctx, { donor }) => donors.editDonor(ctx, donor, { note: 'x' })),
	tickSafe: on('work', (ctx, { donor }) => donors.tickSafe(ctx, donor, { ticks: [], version: 1 })),
	releaseDonor: on('work', (ctx, { donor }) =>
		donors.releaseDonor(ctx, donor, ReleaseInput.parse({ route: 'own' }))
	),
	stripDonor: on('work', (ctx, { donor }) => donors.stripDonor(ctx, donor)),
	parkDonor: on('work', (ctx, { donor }) => donors.parkDonor(ctx, donor)),
	finishDonor: on('work', (ctx, { donor }) => donors.finishDonor(ctx, donor)),
	reopenDonor: on('work', (ctx, { donor }) => donors.reopenDonor(ctx, donor)),
	leaveDonor: on('trade', (ctx, { donor }) => donors.leaveDonor(ctx, donor, 'sell')),
	bringBackDonor: on('work', (ctx, { donor }) => donors.bringBackDonor(ctx, donor, {})),
	reviewDonor: on('work', (ctx, { donor }) => donors.reviewDonor(ctx, donor)),
	addDonorPhoto: on('work', (ctx, { donor }) =>
		donors.addDonorPhoto(ctx, donor, Buffer.alloc(0), 'front')
	),
	addKeptPhoto: on('work', (ctx, { donor }) => donors.addKeptPhoto(ctx, donor, kept, 'front')),
	changeShot: on('work', (ctx, refs) => donors.changeShot(ctx, refs.donor, refs.photo, 'box')),
	askReading: on('work', (ctx, refs) => donors.askReading(ctx, refs.donor, refs.photo)),
	listReadings: on('see', (ctx, { donor }) => donors.listReadings(ctx, donor)),
	takeLabel: on('work', (ctx, { donor, reading }) =>
		donors.takeLabel(ctx, donor, { reading, fields: ['model'], edit: { model: 'TARN-22' } })
	),
	undoTakeLabel: on('work', (ctx, refs) => donors.undoTakeLabel(ctx, refs.donor, refs.takeEvent)),
	removeDonorPhoto: on('work', (ctx, refs) => donors.removeDonorPhoto(ctx, refs.donor, refs.photo)),
	putBackDonorPhoto: on('work', (ctx, refs) =>
		donors.putBackDonorPhoto(ctx, refs.donor, refs.photo)
	),
	removedDonorPhotos: on('see', (ctx, { donor }) => donors.removedDonorPhotos(ctx, donor)),
	// yard
	getFinish: on('see', (ctx, { donor }) => yard.getFinish(ctx, donor)),
	finishStripping: on('work', (ctx, { donor }) =>
		yard.finishStripping(ctx, donor, { grams: 9000, scrapClass: 'Al-Fe', drained: [] })
	),
	listRegister: off('work', (ctx) => yard.listRegister(ctx)),
	addScrapRun: on('work', (ctx, { donor }) =>
		yard.addScrapRun(ctx, ScrapRun.parse({ ...SCRAP_RUN, donors: [donor] }))
	),
	takeBackScrapRun: on('work', (ctx, refs) =>
		yard.takeBackScrapRun(ctx, refs.scrapRun, { reason: 'wrong' })
	),
	getScrapRun: on('work', (ctx, refs) => yard.getScrapRun(ctx, refs.scrapRun)),
	listScrapRuns: off('work', (ctx) => yard.listScrapRuns(ctx)),
	readyForScrap: off('work', yard.readyForScrap),
	addWaste: off('work', (ctx) => yard.addWaste(ctx, WASTE)),
	correctWaste: on('work', (ctx, refs) => yard.correctWaste(ctx, refs.waste)),
	listWaste: off('work', yard.listWaste),
	getTriage: on('see', (ctx, { donor }) => donors.getTriage(ctx, donor)),
	saveTriage: on('work', (ctx, { donor }) =>
		donors.saveTriage(ctx, donor, { answers: { turn: 'free' }, inPlace: {}, version: 0 })
	),
	undoTriage: on('work', (ctx, { donor }) => donors.undoTriage(ctx, donor, 1)),
	// prices
	listPrices: off('see', (ctx) => prices.listPrices(ctx)),
	listRemoved: off('see', prices.listRemoved),
	pricedEngines: off('see', prices.pricedEngines),
	findPrice: off('see', (ctx) => prices.findPrice(ctx, { ...PRICE, number: '' })),
	getPrice: on('see', (ctx, { price }) => prices.getPrice(ctx, price)),
	putPrice: off('trade', (ctx) => prices.putPrice(ctx, PRICE)),
	editPrice: on('trade', (ctx, { price }) =>
		prices.editPrice(ctx, price, { ...PRICE, version: 1 })
	),
	removePrice: on('trade', (ctx, { price }) => prices.removePrice(ctx, price, 1)),
	listReplaced: off('see', (ctx) => prices.listReplaced(ctx, ['TN 1'])),
	replaceNumber: off('work', (ctx) =>
		prices.replaceNumber(ctx, { number: 'TN 1', by: 'TN 2', ways: 'one', note: '' })
	),
	putBackPrice: on('trade', (ctx, { priceEvent }) => prices.putBackPrice(ctx, priceEvent)),
	// parts
	listFits: on('see', (ctx, { part }) => parts.listFits(ctx, part)),
	noteFit: on('work', (ctx, { part }) =>
		parts.noteFit(ctx, part, { engine: 'Pellwyn 9', fits: 'yes', because: '', ways: 'one' })
	),
	getPart: on('see', (ctx, { part }) => parts.getPart(ctx, part)),
	firstPhotos: off('see', (ctx, refs) => parts.firstPhotos(ctx, [refs.part])),
	partsByIds: off('see', (ctx, { partId }) => parts.partsByIds(ctx, [partId])),
	partVerdicts: off('see', async (ctx, { partId }) => [
		...(await parts.partVerdicts(ctx, [partId]))
	]),
	waitedFor: off('see', async (ctx, { partId }) => [...(await parts.waitedFor(ctx, [partId]))]),
	kindVerdicts: on('see', (ctx, { donorId }) => parts.kindVerdicts(ctx, donorId, ['carb-float'])),
	kindsStillOn: on('see', (ctx, { donor }) => parts.kindsStillOn(ctx, donor)),
	planFor: on('see', (ctx, { donor }) => parts.planFor(ctx, donor, 30)),
	benchFor: on('see', (ctx, { donor }) => parts.benchFor(ctx, donor, 30)),
	watchBench: on('see', (ctx, { donor }) => parts.watchBench(ctx, donor)),
	leaveKindOn: on('work', (ctx, { donor }) => parts.leaveKindOn(ctx, donor, 'muffler')),
	takeKindUp: on('work', (ctx, { donor }) => parts.takeKindUp(ctx, donor, 'muffler')),
	cleaningFor: on('see', (ctx, { part }) => parts.cleaningFor(ctx, part)),
	cleanPart: on('work', (ctx, { part }) => parts.cleanPart(ctx, part, { cameRight: false })),
	choicesFor: on('see', (ctx, { donor }) => parts.choicesFor(ctx, donor)),
	whatItTaught: off('see costs', parts.whatItTaught),
	workOut: off('see terms', (ctx) => parts.workOut(ctx, CALCULATION)),
	countDonorParts: off('see', (ctx, { donorId }) => parts.countDonorParts(ctx, donorId)),
	listDonorParts: off('see', (ctx, { donorId }) => parts.listDonorParts(ctx, donorId)),
	binsFor: off('see', (ctx) => parts.binsFor(ctx, 'carb-float')),
	recentFor: off('see', parts.recentFor),
	usualKinds: off('see', parts.usualKinds),
	chanceOn: off('see', (ctx) => parts.chanceOn(ctx, 'carb-float', null)),
	getPinnedPhoto: on('see', (ctx, refs) => parts.getPinnedPhoto(ctx, refs.donor, refs.photo)),
	listPins: on('see', (ctx, { donor }) => parts.listPins(ctx, donor)),
	listPinsOfPart: on('see', (ctx, { part }) => parts.listPinsOfPart(ctx, part)),
	placePin: on('work', (ctx, { donor, photo }) =>
		parts.placePin(ctx, donor, { photo, x: 0.5, y: 0.5, kind: 'coil' })
	),
	changePin: on('work', (ctx, { donor, pin }) =>
		parts.changePin(ctx, donor, { pin, x: 0.1, y: 0.1 })
	),
	removePin: on('work', (ctx, { donor, pin }) => parts.removePin(ctx, donor, pin)),
	setRuler: on('work', (ctx, { donor, photo }) =>
		parts.setRuler(ctx, donor, photo, { ...ENDS, length: '2 in' })
	),
	noteMeasure: on('work', (ctx, { donor, photo, part }) =>
		parts.noteMeasure(ctx, donor, photo, { ...ENDS, part, what: 'bolt to bolt' })
	),
	pullSeen: on('work', (ctx, { donor }) =>
		parts.pullSeen(ctx, donor, { kinds: [{ kind: 'recoil', grade: 'usable' }] })
	),
	pullPart: on('work', (ctx, { donor }) => parts.pullPart(ctx, donor, OLD)),
	logOldStock: off('work', (ctx) => parts.logOldStock(ctx, OLD)),
	editPart: on('work', (ctx, { part }) => parts.editPart(ctx, part, { version: 1, note: 'x' })),
	gradePart: on('work', (ctx, { part }) =>
		parts.gradePart(ctx, part, { grade: 'core', version: 1 })
	),
	movePart: on('work', (ctx, refs) => parts.movePart(ctx, refs.part, { bin: refs.bin })),
	provePart: on('work', (ctx, { part }) =>
		parts.provePart(ctx, part, { how: 'look-over', passed: true })
	),
	hangPhoto: on('work', (ctx, { part }) => parts.hangPhoto(ctx, part, kept)),
	removePartPhoto: on('work', (ctx, refs) => parts.removePartPhoto(ctx, refs.part, refs.photo)),
	putBackPartPhoto: on('work', (ctx, refs) => parts.putBackPartPhoto(ctx, refs.part, refs.photo)),
	removedPartPhotos: on('see', (ctx, { part }) => parts.removedPartPhotos(ctx, part)),
	photographAny: on('work', (ctx, { part }) =>
		parts.photographAny(ctx, { of: part, shot: 'other' }, { ...kept, key: crypto.randomUUID() })
	),
	addPartPhoto: on('work', (ctx, { part }) => parts.addPartPhoto(ctx, part, Buffer.alloc(0))),
	scrapPart: on('work', (ctx, { part }) => parts.scrapPart(ctx, part, { reason: 'worn' })),
	missPart: on('work', (ctx, { part }) => parts.missPart(ctx, part)),
	foundPart: on('work', (ctx, { part }) => parts.foundPart(ctx, part)),
	holdPart: on('hold', (ctx, { part }) => parts.holdPart(ctx, part, { for: 'Tamsin' })),
	freePart: on('hold', (ctx, { part }) => parts.freePart(ctx, part)),
	fitPart: on('hold', (ctx, { part }) => parts.fitPart(ctx, part, { job: 'mower' })),
	sellPart: on('trade', (ctx, { part }) => parts.sellPart(ctx, part, { cents: 100 })),
	takeBackPart: on('trade', (ctx, { part }) => parts.takeBackPart(ctx, part, { reason: 'leaks' })),
	putAway: off('work', (ctx, { part }) => parts.putAway(ctx, { parts: [part], bin: 'K9-9' })),
	undoParts: off('work', (ctx, { partEvent }) => parts.undoParts(ctx, { events: [partEvent] })),
	undoPart: on('work', (ctx, { partEvent }) => parts.undoPart(ctx, partEvent)),
	undoChanges: on('work', (ctx, { pinEvent }) => parts.undoChanges(ctx, [pinEvent])),
	// tags and labels
	findTag: off('see', (ctx, { part }) => tags.findTag(ctx, part)),
	listBlanks: off('see', (ctx) => tags.listBlanks(ctx)),
	mintBlanks: off('work', (ctx) => tags.mintBlanks(ctx, { count: 1 })),
	getLabelSettings: off('see', labels.getLabelSettings),
	toPrint: off('see', labels.toPrint),
	previewLabels: off('see', (ctx, refs) => labels.previewLabels(ctx, labelsOf(refs), 'a4')),
	printLabels: on('see', (ctx, refs) => labels.printLabels(ctx, labelsOf(refs), 'a4')),
	printOutlines: off('see', (ctx) => labels.printOutlines(ctx, 'a4')),
	saveStock: off('work', async (ctx) => {
		const { version } = await labels.getLabelSettings(ctx);
		await labels.saveStock(ctx, { stock: 'a4', measures: stockOf('a4').measures, version });
	}),
	resetStock: off('work', (ctx) => labels.resetStock(ctx, 'a4')),
	sayWhose: off('run', (ctx) => labels.sayWhose(ctx, true)),
	// find
	exportParts: off('see', (ctx) =>
		new Response(exportParts(ctx, readQuestion(new URLSearchParams('q=carburetor')))).text()
	),
	findParts: off('see', (ctx) => findParts(ctx, readQuestion(new URLSearchParams('q=carburetor')))),
	// customers
	listCustomers: off('trade', (ctx) => customers.listCustomers(ctx, { q: 'ida' })),
	getCustomer: on('trade', (ctx, { customer }) => customers.getCustomer(ctx, customer)),
	addCustomer: off('trade', (ctx) => customers.addCustomer(ctx, CUSTOMER)),
	editCustomer: on('trade', (ctx, { customer }) =>
		customers.editCustomer(ctx, customer, { ...CUSTOMER, phone: '', version: 1 })
	),
	lettersAbout: off('trade', (ctx) => customers.lettersAbout(ctx, 'want', [1])),
	sendAgain: on('trade', (ctx, { letter }) => customers.sendAgain(ctx, letter)),
	letterSettings: off('see', customers.letterSettings),
	saveLetterSettings: off('run', (ctx) => customers.saveLetterSettings(ctx, SETTINGS)),
	listTemplates: off('run', customers.listTemplates),
	saveTemplate: off('run', (ctx) => customers.saveTemplate(ctx, LETTER)),
	exportCustomers: off('run', customers.exportCustomers),
	exportCustomer: on('run', (ctx, { customer }) => customers.exportCustomer(ctx, customer)),
	// wants
	listWants: off('trade', (ctx) => wants.listWants(ctx)),
	countWants: off('trade', wants.countWants),
	countFresh: off('trade', wants.countFresh),
	getWant: on('trade', (ctx, { want }) => wants.getWant(ctx, want)),
	wantState: on('trade', (ctx, { want }) => wants.wantState(ctx, want)),
	draftFor: on('trade', (ctx, { want }) => wants.draftFor(ctx, want)),
	partWanted: off('see', (ctx, { partId }) => wants.partWanted(ctx, partId)),
	donorWanted: off('see', (ctx, { donorId }) => wants.donorWanted(ctx, donorId)),
	customerFile: on('run', (ctx, { customer }) => wants.customerFile(ctx, customer)),
	addWant: on('trade', (ctx, { customer }) => wants.addWant(ctx, { customer, kind: 'coil' })),
	editWant: on('trade', (ctx, { want }) => wants.editWant(ctx, want, { note: 'x', version: 1 })),
	seeWant: on('trade', (ctx, { want }) => wants.seeWant(ctx, want)),
	dropMatch: on('trade', (ctx, refs) => wants.dropMatch(ctx, refs.want, refs.wantMatch)),
	undoWant: on('trade', (ctx, refs) => wants.undoWant(ctx, refs.want, refs.wantEvent)),
	tellWant: on('trade', (ctx, { want }) => wants.tellWant(ctx, want, { by: 'phone' })),
	sayYes: on('trade', (ctx, { want }) => wants.sayYes(ctx, want, {})),
	sayNo: on('trade', (ctx, { want }) => wants.sayNo(ctx, want)),
	waitOn: on('trade', (ctx, { want }) => wants.waitOn(ctx, want)),
	closeWant: on('trade', (ctx, { want }) => wants.closeWant(ctx, want)),
	takeOffWant: on('trade', (ctx, { want }) => wants.takeOffWant(ctx, want)),
	eraseCustomer: on('run', (ctx, { customer }) => customers.eraseCustomer(ctx, customer)),
	rehomePart: on('work', (ctx, refs) => parts.rehomePart(ctx, refs.part, refs.bin)),
	// walks
	listWalks: off('see', walks.listWalks),
	walkChoices: off('see', walks.walkChoices),
	redParts: off('see', walks.redParts),
	moneyInBins: off('see', async (ctx) => [...(await walks.moneyInBins(ctx))]),
	daysInBins: off('see', async (ctx) => [...(await walks.daysInBins(ctx))]),
	getWalk: on('see', (ctx, { walk }) => walks.getWalk(ctx, walk)),
	findStray: on('see', (ctx, { walk, part }) => walks.findStray(ctx, walk, 0, part)),
	startWalk: off('work', (ctx) => walks.startWalk(ctx, { what: 'put away' })),
	answerStop: on('work', (ctx, { walk }) =>
		walks.answerStop(ctx, walk, { stop: 1, outcome: 'not there' })
	),
	takeBackAnswer: on('work', (ctx, { walk }) => walks.takeBackAnswer(ctx, walk, { stop: 1 })),
	allThere: on('work', (ctx, { walk }) => walks.allThere(ctx, walk, { place: 0 })),
	putStrayRight: on('work', (ctx, { walk, part }) =>
		walks.putStrayRight(ctx, walk, { place: 0, code: part, then: 'home' })
	),
	endWalk: on('work', (ctx, { walk }) => walks.endWalk(ctx, walk)),
	reopenWalk: on('work', (ctx, { walk }) => walks.reopenWalk(ctx, walk)),
	undoBin: on('work', (ctx, { binEvent }) => bins.undoBin(ctx, binEvent)),
	mergeBins: on('work', (ctx, refs) => walks.mergeBins(ctx, refs.bin, { into: 'Q1-1' }))
};

/** What the doors of the rooms export besides: pieces for rooms to the right, keepers of routes, jobs. */
const PIECES = [
	...['allow', 'authHandle', 'signIn', 'signOut', 'SignInFailed', 'action', 'answerForm', 'page'],
	...['contextFor', 'formKey', 'change', 'changeKey', 'jsonFault', 'read', 'identify', 'record'],
	...['fingerprint', 'once', 'wasAnswered', 'acceptInvite', 'findInvite', 'allShopIds', 'shopsOf'],
	...['visitorAction', 'setPassword', 'openAnother', 'signUp', 'cleanPhoto', 'actionWithPhotos'],
	...[
		'changeWithPhoto',
		'removedAmong',
		'readText',
		'findPlace',
		'redBin',
		'donorRow',
		'findBox',
		'newestRelease',
		'notToLeave'
	],
	...['pullableDonor', 'pricesFor', 'expireHolds', 'chanceBy', 'recentFigures'],
	...['newToken', 'tokenHash', 'customerRow', 'knownCustomer', 'writeLetter', 'templateFor'],
	...['findLetter', 'startLetters', 'stopLetters', 'quietWants', 'SHOWN'],
	...['lastCounted', 'shelves', 'binEvent', 'recordUndone', 'undoBinChange', 'undoDonorMove'],
	...['mintTag', 'strangerWaits', 'tagOwner']
];

/** Functions of the doors that stand in neither list. */
export const unlisted = (): string[] =>
	[people, photos, bins, donors, prices, parts, tags, labels, walks, customers, wants]
		.flatMap((door) => Object.keys(door))
		.filter((name) => !(name in DOORS) && !PIECES.includes(name));
