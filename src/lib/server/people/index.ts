// People: who signs in, which shops they belong to, what their role lets them do; the shop's settings and policy.
// Also the doorkeeper that every route of a shop passes, and the record of what happened.
// Not for: what a shop holds (donors, parts, prices).
export { allow } from './allow';
export { authHandle, SignInFailed, signIn, signOut } from './auth';
export { action, answerForm, contextFor, formKey, page } from './doorkeeper';
export { change, changeKey, jsonFault, read } from './edge';
export { newToken, tokenHash } from './hash';
export { identify } from './identify';
export { acceptInvite, findInvite } from './accept-invite';
export { inviteMember, withdrawInvite } from './invites';
export { addKey, revokeKey } from './keys';
export { editMember, listInvites, listMembers } from './members';
export { fingerprint, once, wasAnswered } from './once';
export { record, type Happening } from './record';
export { editPolicy, editShop, getPolicy, getPolicyRow, getShop, setSeason } from './settings';
export { allShopIds, shopsOf, type Membership } from './shops';
export { visitorAction } from './visitor';
export { setPassword } from './persons';
export { openAnother, signUp } from './sign-up';
