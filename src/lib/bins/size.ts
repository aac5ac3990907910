export const BIN_SIZES = ['s', 'm', 'l', 'xl'] as const;
export type BinSize = (typeof BIN_SIZES)[number];
