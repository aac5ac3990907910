import { Buffer } from 'node:buffer';
import { BinInput } from '../../src/lib/bins/input';
import { ReleaseInput } from '../../src/lib/donors/input';
import type { Ability } from '../../src/lib/people/role';
import * as bins from '../../src/lib/server/bins';
import type { Context } from '../../src/lib/server/context';
import * as donors from '../../src/lib/server/donors';
import { exportParts, findParts } from '../../src/lib/server/find';
import * as parts from '../../src/lib/server/parts';
import * as people from '../../src/lib/server/people';
import * as photos from '../../src/lib/server/photos';
import * as prices from '../../src/lib/server/prices';
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
	priceEvent: number;
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

const kept = { key: '1/none', width: 1, height: 1, bytes: 1 };
const bin = BinInput.parse({ address: 'Q1-1', size: 'm' });
const PRICE = {
	kind: 'carb-float',
	engine: 'Ondrake TARN-21L',
	newCents: 4000,
	source: 'list',
	seenOn: '2026-03-01'
};
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
const SHOP = {
	name: 'Ours',
	currency: 'USD',
	timeZone: 'UTC',
	units: 'inch' as const,
	season: 'normal' as const,
	version: 1
};

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
	addDonorPhoto: on('work', (ctx, { donor }) =>
		donors.addDonorPhoto(ctx, donor, Buffer.alloc(0), 'front')
	),
	addKeptPhoto: on('work', (ctx, { donor }) => donors.addKeptPhoto(ctx, donor, kept, 'front')),
	removeDonorPhoto: on('work', (ctx, refs) => donors.removeDonorPhoto(ctx, refs.donor, refs.photo)),
	putBackDonorPhoto: on('work', (ctx, refs) =>
		donors.putBackDonorPhoto(ctx, refs.donor, refs.photo)
	),
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
	kindVerdicts: on('see', (ctx, { donorId }) => parts.kindVerdicts(ctx, donorId, ['carb-float'])),
	kindsStillOn: on('see', (ctx, { donor }) => parts.kindsStillOn(ctx, donor)),
	planFor: on('see', (ctx, { donor }) => parts.planFor(ctx, donor, 30)),
	choicesFor: on('see', (ctx, { donor }) => parts.choicesFor(ctx, donor)),
	whatItTaught: off('see costs', parts.whatItTaught),
	workOut: off('see terms', (ctx) => parts.workOut(ctx, CALCULATION)),
	countDonorParts: off('see', (ctx, { donorId }) => parts.countDonorParts(ctx, donorId)),
	listDonorParts: off('see', (ctx, { donorId }) => parts.listDonorParts(ctx, donorId)),
	binsFor: off('see', (ctx) => parts.binsFor(ctx, 'carb-float')),
	recentFor: off('see', parts.recentFor),
	usualKinds: off('see', parts.usualKinds),
	chanceOn: off('see', (ctx) => parts.chanceOn(ctx, 'carb-float', null)),
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
	addPartPhoto: on('work', (ctx, { part }) => parts.addPartPhoto(ctx, part, Buffer.alloc(0))),
	scrapPart: on('work', (ctx, { part }) => parts.scrapPart(ctx, part, { reason: 'worn' })),
	missPart: on('work', (ctx, { part }) => parts.missPart(ctx, part)),
	foundPart: on('work', (ctx, { part }) => parts.foundPart(ctx, part)),
	holdPart: on('hold', (ctx, { part }) => parts.holdPart(ctx, part, { for: 'Tamsin' })),
	freePart: on('hold', (ctx, { part }) => parts.freePart(ctx, part)),
	fitPart: on('hold', (ctx, { part }) => parts.fitPart(ctx, part, { job: 'mower' })),
	sellPart: on('trade', (ctx, { part }) => parts.sellPart(ctx, part, { cents: 100 })),
	takeBackPart: on('trade', (ctx, { part }) => parts.takeBackPart(ctx, part, { reason: 'leaks' })),
	undoPart: on('work', (ctx, { partEvent }) => parts.undoPart(ctx, partEvent)),
	// find
	exportParts: off('see', (ctx) =>
		new Response(exportParts(ctx, readQuestion(new URLSearchParams('q=carburetor')))).text()
	),
	findParts: off('see', (ctx) => findParts(ctx, readQuestion(new URLSearchParams('q=carburetor'))))
};

/** What the doors of the rooms export besides: pieces for rooms to the right, keepers of routes, jobs. */
const PIECES = [
	...['allow', 'authHandle', 'signIn', 'signOut', 'SignInFailed', 'action', 'answerForm', 'page'],
	...['contextFor', 'formKey', 'change', 'changeKey', 'jsonFault', 'read', 'identify', 'record'],
	...['fingerprint', 'once', 'wasAnswered', 'acceptInvite', 'findInvite', 'allShopIds', 'shopsOf'],
	...['visitorAction', 'setPassword', 'openAnother', 'signUp', 'cleanPhoto', 'actionWithPhotos'],
	...['changeWithPhoto', 'findPlace', 'redBin', 'donorRow', 'findBox', 'newestRelease'],
	...['pullableDonor', 'pricesFor', 'expireHolds', 'chanceBy', 'recentFigures']
];

/** Functions of the doors that stand in neither list. */
export const unlisted = (): string[] =>
	[people, photos, bins, donors, prices, parts]
		.flatMap((door) => Object.keys(door))
		.filter((name) => !(name in DOORS) && !PIECES.includes(name));
