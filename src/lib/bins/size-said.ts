import type { BinSize } from './size';

export const SIZE_SAID: Record<BinSize, string> = {
	s: 'small: a drawer or tray',
	m: 'medium: a bin',
	l: 'large: a shelf box',
	xl: 'extra large: a pallet place'
};
