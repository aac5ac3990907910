import nodemailer, { type Transporter } from 'nodemailer';
import { env } from '../env';

export interface Letter {
	to: string;
	subject: string;
	text: string;
	/** Makes the Message-ID, so that a job tried twice is one letter. */
	key?: string;
}

let post: Transporter | undefined;

/** Sends one plain-text letter over SMTP; throws when the server does not take it. */
export async function sendLetter(letter: Letter): Promise<void> {
	post ??= nodemailer.createTransport(env().SMTP_URL);
	const { key, ...rest } = letter;
	const host = new URL(env().ORIGIN).hostname;
	await post.sendMail({
		from: env().MAIL_FROM,
		...rest,
		...(key ? { messageId: `<${key}@${host}>` } : {})
	});
}
