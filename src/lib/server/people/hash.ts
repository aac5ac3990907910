import { hash, verify, type Options } from '@node-rs/argon2';
import { createHash, randomBytes } from 'node:crypto';

/** argon2id is the package's default algorithm. */
const STRENGTH: Options = { memoryCost: 65_536, timeCost: 3, parallelism: 1 };
const MOST_AT_ONCE = 4;

let running = 0;
const waiting: (() => void)[] = [];

/** Hashing takes 64 MB a piece: a burst of sign-ins queues instead of filling the memory. */
async function inTurn<T>(work: () => Promise<T>): Promise<T> {
	if (running >= MOST_AT_ONCE) await new Promise<void>((go) => waiting.push(go));
	else running++;
	try {
		return await work();
	} finally {
		const next = waiting.shift();
		if (next) next();
		else running--;
	}
}

export const hashPassword = (password: string) =>
	inTurn(() => hash(password.normalize('NFC'), STRENGTH));

let nobody: Promise<string> | undefined;

/** Takes as long for an unknown person as for a known one. */
export async function passwordFits(stored: string | undefined, password: string): Promise<boolean> {
	nobody ??= hashPassword(randomBytes(24).toString('base64'));
	const against = stored ?? (await nobody);
	const fits = await inTurn(() => verify(against, password.normalize('NFC')));
	return fits && stored !== undefined;
}

/** 256 random bits for a link or key; only its hash is kept. */
export const newToken = () => randomBytes(32).toString('base64url');
export const tokenHash = (token: string) => createHash('sha256').update(token).digest('base64url');
