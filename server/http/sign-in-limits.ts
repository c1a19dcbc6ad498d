import { RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible';
import type { Pools } from '../db/pools';
import type { SignInServices } from './context';
import { ProblemError } from './problem-error';

/**
 * Counts failed sign-ins per address and per address-with-account, never per account alone: a stranger who guesses at
 * a colleague's account from elsewhere must not be able to lock the colleague out.
 */
export function openSignInLimits(pools: Pools, tidy: boolean): SignInServices {
  const shared = {
    storeClient: pools.platform,
    storeType: 'pool' as const,
    tableName: 'sign_in_limits',
    tableCreated: true,
    clearExpiredByTimeout: tidy,
  };
  const perPair = new RateLimiterPostgres({ ...shared, keyPrefix: 'pair', points: 8, duration: 15 * 60 });
  const perAddress = new RateLimiterPostgres({
    ...shared,
    keyPrefix: 'address',
    points: 60,
    duration: 15 * 60,
  });
  const pair = (address: string, account: string) => `${address}|${account.toLowerCase()}`.slice(0, 400);
  return {
    countAttempt: async (address, account) => {
      try {
        await perPair.consume(pair(address, account));
        await perAddress.consume(address);
      } catch (error) {
        if (!(error instanceof RateLimiterRes)) throw error;
        throw new ProblemError('too-many-attempts', { retryAfterS: Math.ceil(error.msBeforeNext / 1000) });
      }
    },
    forgetAttempts: async (address, account) => {
      await perPair.delete(pair(address, account));
      await perAddress.reward(address);
    },
  };
}
