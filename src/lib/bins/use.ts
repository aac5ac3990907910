/** What a bin is kept for, beside the kinds that are named for it. */
export const BIN_USES = ['heavy', 'dry', 'fuel', 'rubber', 'small'] as const;
export type BinUse = (typeof BIN_USES)[number];

export const USE_SAID: Record<BinUse, string> = {
	heavy: 'heavy things',
	dry: 'what rusts, and electrics: dry',
	fuel: 'what held fuel',
	rubber: 'rubber: dark and cool',
	small: 'small things'
};
