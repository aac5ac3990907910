import type { Role } from './role';

export interface MemberRow {
	id: number;
	name: string;
	/** Absent for a key that scripts use. */
	email: string | null;
	role: Role;
	disabled: boolean;
	version: number;
	keyId: number | null;
}

export interface OpenInvite {
	id: number;
	email: string;
	role: Role;
	expiresAt: Date;
}

export interface InviteView {
	shopName: string;
	slug: string;
	email: string;
	role: Role;
	/** Somebody signs in with the invited address already. */
	known: boolean;
}
