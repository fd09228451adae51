/** What other features may use of accounts: one-time links and finding or making the person behind an address. */
export { makeConfirmedAccount } from './account.service.ts';
export { findByEmail } from './people.store.ts';
export { createToken, findToken, spendToken } from './tokens.store.ts';
