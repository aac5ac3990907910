import { env } from '../../env';
import { sendLetter } from '../../mail';

export interface InviteLetter {
	to: string;
	shopName: string;
	role: string;
	token: string;
	inviteId: number;
}

export function sendInviteLetter(letter: InviteLetter): Promise<void> {
	return sendLetter({
		to: letter.to,
		subject: `Join ${letter.shopName} on Endplay`,
		key: `invite-${letter.inviteId}`,
		text: `${letter.shopName} invites you to its parts shelf on Endplay as ${letter.role}.

Open this link within seven days:

${env().ORIGIN}/invite/${letter.token}
`
	});
}
