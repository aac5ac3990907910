import { CAUSES, ENGINE_CLASSES, FITTINGS, SAFE_TICKS } from '$lib/trade';
import { FITTING_SAID } from './fittings';

const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

/** The lists that forms about donors offer; handed to pages by their load, so that phones need no trade data. */
export const causeOptions = CAUSES.filter((cause) => cause.id !== 'unknown').map(
	({ id, said }) => ({
		value: id as string,
		label: capital(said)
	})
);

export const classOptions = ENGINE_CLASSES.map(({ id, said }) => ({
	value: id as string,
	label: capital(said)
}));

export const fittingOptions = FITTINGS.map((fitting) => ({
	value: fitting as string,
	label: capital(FITTING_SAID[fitting])
}));

export const donorOptions = { causeOptions, classOptions, fittingOptions, ticks: SAFE_TICKS };
