import { DrizzleAdapter } from '@auth/drizzle-adapter';
import { CredentialsSignin, SvelteKitAuth, type SvelteKitAuthConfig } from '@auth/sveltekit';
import Credentials from '@auth/sveltekit/providers/credentials';
import Nodemailer from '@auth/sveltekit/providers/nodemailer';
import { db } from '../db';
import { env, overTls } from '../env';
import { faultSaid, log } from '../log';
import { sendSignInLetter } from './letters/sign-in';
import { clearTries, signInByPassword } from './sign-in';
import { account, person, session, verificationToken } from './tables';

const SESSION_SECONDS = 30 * 24 * 3600;
export const LINK_SECONDS = 10 * 60;

/** A wrong password, or one that came too soon: the code carries the seconds to wait. */
export class SignInFailed extends CredentialsSignin {
	constructor(readonly waitSeconds: number) {
		super();
		this.code = waitSeconds > 0 ? `wait-${waitSeconds}` : 'wrong';
	}
}

/** The name that browsers bind to the host where the site is served over TLS. */
export const sessionCookie = () => (overTls() ? '__Host-endplay.session' : 'endplay.session');

const adapter = () =>
	DrizzleAdapter(db(), {
		usersTable: person,
		accountsTable: account,
		sessionsTable: session,
		verificationTokensTable: verificationToken
	});

const byPassword = Credentials({
	credentials: { email: { label: 'E-mail' }, password: { label: 'Password', type: 'password' } },
	async authorize({ email, password }) {
		if (typeof email !== 'string' || typeof password !== 'string') throw new SignInFailed(0);
		const answer = await signInByPassword(db(), { email, password }, new Date());
		if ('who' in answer) return answer.who;
		throw new SignInFailed('waitSeconds' in answer ? answer.waitSeconds : 0);
	}
});

function config(): SvelteKitAuthConfig {
	const sessions = adapter();
	return {
		adapter: sessions,
		secret: env().AUTH_SECRET,
		trustHost: true,
		basePath: '/auth',
		session: { strategy: 'database', maxAge: SESSION_SECONDS, updateAge: SESSION_SECONDS },
		pages: { signIn: '/sign-in', verifyRequest: '/sign-in/sent', error: '/sign-in' },
		cookies: {
			sessionToken: {
				name: sessionCookie(),
				options: { httpOnly: true, sameSite: 'lax', path: '/', secure: overTls() }
			}
		},
		providers: [
			byPassword,
			Nodemailer({
				server: env().SMTP_URL,
				from: env().MAIL_FROM,
				maxAge: LINK_SECONDS,
				sendVerificationRequest: ({ identifier, url }) => sendSignInLetter(identifier, url)
			})
		],
		callbacks: {
			// Both ways of signing in end in a row of the session table: delete the row and the person is out.
			jwt: ({ token, account, user }) =>
				account?.provider === 'credentials' && user.id ? { ...token, personId: user.id } : token,
			session: ({ session, user }) => ({
				expires: session.expires,
				user: { id: user.id, name: user.name, email: user.email }
			})
		},
		jwt: {
			async encode({ token }) {
				const personId = token?.personId;
				if (typeof personId !== 'string') throw new Error('A session without a person');
				const made = await sessions.createSession!({
					sessionToken: crypto.randomUUID() + crypto.randomUUID(),
					userId: personId,
					expires: new Date(Date.now() + SESSION_SECONDS * 1000)
				});
				return made.sessionToken;
			}
		},
		events: {
			async signIn({ user }) {
				if (user.email) await clearTries(db(), user.email);
			}
		},
		logger: {
			error: (fault) => {
				if (!(fault instanceof CredentialsSignin)) log().warn(faultSaid(fault), 'sign-in');
			},
			warn: () => undefined,
			debug: () => undefined
		}
	};
}

let made: { of: ReturnType<typeof db>; config: SvelteKitAuthConfig } | undefined;

/** Made once for a database: it describes every table of its own, which takes longer than an answer may. */
function keptConfig(): SvelteKitAuthConfig {
	const of = db();
	if (made?.of !== of) made = { of, config: config() };
	return made.config;
}

export const { handle: authHandle, signIn, signOut } = SvelteKitAuth(async () => keptConfig());
