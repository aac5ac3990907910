import { building, dev } from '$app/environment';
import { NotFound } from '$lib/refusal';
import { closeDb } from '$lib/server/db';
import { closeLine } from '$lib/server/db/listen';
import { env } from '$lib/server/env';
import { FAULT_SAID } from '$lib/server/http/fault';
import { onEveryAnswer } from '$lib/server/http/every-answer';
import { BARE_POLICY } from '$lib/server/http/headers';
import { notHere } from '$lib/server/http/not-here';
import { endStreams } from '$lib/server/http/stream';
import { fromElsewhere } from '$lib/server/http/origin';
import { tasks } from '$lib/server/jobs';
import { logFault } from '$lib/server/log';
import { authHandle, identify, jsonFault } from '$lib/server/people';
import { startQueue, stopQueue } from '$lib/server/queue';
import {
	json,
	redirect,
	type Handle,
	type HandleServerError,
	type RequestEvent,
	type ServerInit
} from '@sveltejs/kit';
import { sequence } from '@sveltejs/kit/hooks';

export const init: ServerInit = async () => {
	if (building) return;
	env();
	onEveryAnswer();
	await startQueue(tasks);
	// open streams would keep the process waiting for its visitors
	if (!dev) for (const signal of ['SIGTERM', 'SIGINT']) process.once(signal, endStreams);
	process.on('sveltekit:shutdown', async () => {
		await stopQueue();
		await closeLine();
		await closeDb();
		process.exit(0);
	});
};

/** Only our own pages change anything with a visitor's cookie. */
const ownPages: Handle = ({ event, resolve }) =>
	fromElsewhere(event)
		? json({ code: 'role', message: 'Changes are taken from our own pages only.' }, { status: 403 })
		: resolve(event);

/** Who is it, and for which shop: once a request. */
const identified: Handle = async ({ event, resolve }) => {
	await identify(event);
	return resolve(event);
};

const isApi = (event: RequestEvent) => event.url.pathname.startsWith('/api/');

const noSuchData = () =>
	json({ code: 'not found', message: new NotFound().message }, { status: 404 });

/** Whatever breaks before a door of the outside edge is answered as data too. */
const asData: Handle = async ({ event, resolve }) => {
	try {
		return await resolve(event);
	} catch (thrown) {
		if (isApi(event)) return jsonFault(thrown, event);
		throw thrown;
	}
};

/** What a scanned tag opens says itself what a stranger is told. */
const SCANNED = '/t/[shop=slug]/[tag]';

/** A shop's address opens to its members; to others it is as if it were not there. */
const guard: Handle = async ({ event, resolve }) => {
	const { ctx, person } = event.locals;
	const api = isApi(event);
	if (api && !event.route.id) return noSuchData();
	if (!event.params.shop || ctx || event.route.id === SCANNED) return resolve(event);
	const signedOut = !person;
	if (api && signedOut)
		return json(
			{ code: 'not signed in', message: 'Sign in, or send a key of this shop.' },
			{ status: 401 }
		);
	if (api) return noSuchData();
	if (signedOut)
		redirect(303, `/sign-in?to=${encodeURIComponent(event.url.pathname + event.url.search)}`);
	return notHere();
};

const secure: Handle = async ({ event, resolve }) => {
	const answer = await resolve(event, {
		transformPageChunk: ({ html }) =>
			html.replace('<html lang="en">', `<html lang="en"${theme(event)}>`),
		preload: ({ type, path }) =>
			type === 'js' || type === 'css' || path.includes('archivo-latin-wdth')
	});
	// A redirect's headers cannot be added to: answer with a copy.
	const response = new Response(answer.body, answer);
	if (!response.headers.has('Content-Security-Policy'))
		response.headers.set('Content-Security-Policy', BARE_POLICY);
	return response;
};

const THEMES = ['light', 'dark', 'sunlight'];

const theme = (event: RequestEvent) => {
	const chosen = event.cookies.get('theme');
	return chosen && THEMES.includes(chosen) ? ` data-theme="${chosen}"` : '';
};

export const handle = sequence(secure, asData, ownPages, authHandle, identified, guard);

export const handleError: HandleServerError = ({ error, event, status, message }) => {
	if (status === 404) return { message: 'This page is not here. Look at the address, or go back.' };
	const id = logFault(error, { status, route: event.route.id, said: message });
	return { message: FAULT_SAID, id };
};
