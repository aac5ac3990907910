import nodemailer, { type Transporter } from 'nodemailer';
import { env } from '../env';

export interface Letter {
	to: string;
	subject: string;
	text: string;
	/** Makes the Message-ID, so that a job tried twice is one letter. */
	key?: string;
	/** Where an answer goes. */
	replyTo?: string;
	/** Where such letters are stopped, by one tap of the reader's mail program. */
	unsubscribe?: string;
}

/** Somebody waits for the answer while a sign-in letter leaves. */
const PATIENCE = { connectionTimeout: 5000, greetingTimeout: 5000, socketTimeout: 10_000 };

let post: Transporter | undefined;

const oneTap = (link: string) => ({
	'List-Unsubscribe': `<${link}>`,
	'List-Unsubscribe-Post': 'List-Unsubscribe=One-Click'
});

/** Sends one plain-text letter over SMTP; throws when the server does not take it. */
export async function sendLetter(letter: Letter): Promise<void> {
	post ??= nodemailer.createTransport({ url: env().SMTP_URL, ...PATIENCE });
	const { key, unsubscribe, ...rest } = letter;
	const host = new URL(env().ORIGIN).hostname;
	await post.sendMail({
		from: env().MAIL_FROM,
		...rest,
		...(key ? { messageId: `<${key}@${host}>` } : {}),
		...(unsubscribe ? { headers: oneTap(unsubscribe) } : {})
	});
}
