import { db } from '../../db';
import { env } from '../../env';
import { sendLetter } from '../../mail';
import { mayWriteTo } from '../letter-limit';
import { knowsEmail } from '../sign-in';

/** The link opens on our own address, whatever host the request named. */
function ownLink(url: string): string {
	const { pathname, search } = new URL(url);
	return env().ORIGIN + pathname + search;
}

const known = (link: string) => `Open this link within ten minutes to sign in to Endplay:

${link}

It works once. If you did not ask for it, do nothing: nobody gets in without it.
`;

const unknown =
	() => `Somebody asked for a sign-in link to Endplay for this address, but nobody signs in with it here.

If that was you, the shop's owner can invite you, or you can open a shop of your own:

${env().ORIGIN}/sign-up
`;

/** The same answer on the screen for every address and however often; only the letters know the difference. */
export async function sendSignInLetter(to: string, url: string): Promise<void> {
	if (!(await mayWriteTo(db(), to.trim().toLowerCase(), new Date()))) return;
	const text = (await knowsEmail(db(), to)) ? known(ownLink(url)) : unknown();
	await sendLetter({ to, subject: 'Sign in to Endplay', text });
}
