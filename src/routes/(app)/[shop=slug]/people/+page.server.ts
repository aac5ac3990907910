import { InviteInput, KeyInput, MemberEdit, RowInput, SeasonSwitch } from '$lib/people/input';
import {
	action,
	addKey,
	editMember,
	inviteMember,
	listInvites,
	listMembers,
	page,
	revokeKey,
	setSeason,
	withdrawInvite
} from '$lib/server/people';

/** Open to all members; who is here and the invitations only to the owner. */
export const load = page('see', async (ctx) => {
	const owner = ctx.role === 'owner';
	return {
		members: owner ? await listMembers(ctx) : [],
		invites: owner ? await listInvites(ctx) : []
	};
});

const back = (done: string) => ({ to: `?done=${encodeURIComponent(done)}` });

export const actions = {
	invite: action('run', InviteInput, async (ctx, input) => {
		await inviteMember(ctx, input);
		return back(`Invitation sent to ${input.email}`);
	}),
	withdraw: action('run', RowInput, async (ctx, { id }) => {
		await withdrawInvite(ctx, id);
		return back('Invitation withdrawn');
	}),
	member: action('run', MemberEdit, async (ctx, input) => {
		await editMember(ctx, input);
		return back('Changed');
	}),
	// The key itself is shown once and kept nowhere, not even for the same form sent again.
	key: action('run', KeyInput, addKey, () => ({ key: null })),
	revoke: action('run', RowInput, async (ctx, { id }) => {
		await revokeKey(ctx, id);
		return back('Key switched off');
	}),
	season: action('run', SeasonSwitch, async (ctx, { season }) => {
		await setSeason(ctx, season);
		return back(`Season: ${season}`);
	})
};
