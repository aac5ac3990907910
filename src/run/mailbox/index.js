// The mailbox for one machine: takes every letter by SMTP, keeps it as a file, shows it on a page.
// It is not a mail server: nothing is ever sent on, and it listens on loopback only.
// Needs the npm packages smtp-server and mailparser.
import { createServer } from 'node:http';
import { join } from 'node:path';
import { SMTPServer } from 'smtp-server';
import { listenRemembered } from '../ports.js';
import { Letters } from './letters.js';
import { letterPage, listPage } from './page.js';

const largest = 25 * 1024 * 1024;

/**
 * @param {{ dir: string }} options
 * @returns {Promise<{ smtpUrl: string, pageUrl: string, stop: () => Promise<void> }>}
 */
export async function startMailbox({ dir }) {
	const letters = new Letters(dir);
	const smtp = new SMTPServer({
		authOptional: true,
		disabledCommands: ['AUTH', 'STARTTLS'],
		size: largest,
		logger: false,
		onData: (stream, session, done) => take(letters, stream, session).then(() => done(), done)
	});
	smtp.on('error', (error) => console.error('mailbox:', error.message));
	const pages = createServer((request, response) => {
		show(letters, request.url ?? '/', response).catch((error) => {
			console.error('mailbox:', error);
			response.writeHead(500).end();
		});
	});
	const smtpPort = await listenRemembered(smtp.server, join(dir, 'smtp-port'));
	const pagePort = await listenRemembered(pages, join(dir, 'page-port'));
	const stop = async () => {
		pages.close();
		pages.closeAllConnections();
		await new Promise((done) => smtp.close(() => done(undefined)));
	};
	return {
		smtpUrl: `smtp://127.0.0.1:${smtpPort}/?ignoreTLS=true`,
		pageUrl: `http://127.0.0.1:${pagePort}`,
		stop
	};
}

/** @param {Letters} letters @param {import('smtp-server').SMTPServerDataStream} stream @param {import('smtp-server').SMTPServerSession} session */
async function take(letters, stream, session) {
	const chunks = [];
	for await (const chunk of stream) chunks.push(chunk);
	if (stream.sizeExceeded) {
		throw Object.assign(new Error('The letter is too large'), { responseCode: 552 });
	}
	letters.keep(
		Buffer.concat(chunks),
		session.envelope.rcptTo.map(({ address }) => address)
	);
}

/** @param {Letters} letters @param {string} target @param {import('node:http').ServerResponse} response */
async function show(letters, target, response) {
	const url = new URL(target, 'http://mailbox');
	const id = /^\/letters\/([^/]+)$/.exec(url.pathname)?.[1];
	if (url.pathname === '/letters.json') {
		const found = await letters.list(url.searchParams.get('to') ?? undefined);
		const told = found.map(({ to, subject, text, links, date }) => ({
			to,
			subject,
			text,
			links,
			date
		}));
		send(response, 200, 'application/json', JSON.stringify(told));
		return;
	}
	if (url.pathname === '/') {
		send(response, 200, 'text/html; charset=utf-8', listPage(await letters.list()));
		return;
	}
	const letter = id ? await letters.get(decodeURIComponent(id)) : null;
	if (letter) send(response, 200, 'text/html; charset=utf-8', letterPage(letter));
	else send(response, 404, 'text/plain; charset=utf-8', 'There is no such letter.');
}

/** @param {import('node:http').ServerResponse} response @param {number} status @param {string} type @param {string} body */
function send(response, status, type, body) {
	response.writeHead(status, {
		'content-type': type,
		'content-security-policy': "default-src 'none'; style-src 'unsafe-inline'",
		'referrer-policy': 'no-referrer',
		'cache-control': 'no-store',
		connection: 'close',
		'x-content-type-options': 'nosniff'
	});
	response.end(body);
}
