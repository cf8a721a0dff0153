/**
 * The two requests the frame itself makes. In a module of their own, fetched beside the first page: the contract's schemas
 * would otherwise stand before everything else in the initial JavaScript.
 */
import { getAccount, signOut } from '@cairnstep/contract';
import type { Account } from '@cairnstep/contract';
import { call } from './call.ts';

export const askForAccount = (signal: AbortSignal): Promise<Account> => call(getAccount, {}, { signal });

/** Where to go on to, so that the session at the identity provider ends as well. */
export const endSession = async (): Promise<string> => (await call(signOut, {})).continueAt;
