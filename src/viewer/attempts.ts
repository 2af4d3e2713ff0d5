import 'server-only';
import { RateLimiterMemory, RateLimiterRes } from 'rate-limiter-flexible';

const WINDOW_SECONDS = 900;
export const TRIES_PER_ACCOUNT = 10;
export const TRIES_IN_TOTAL = 300;

type Limits = { account: RateLimiterMemory; total: RateLimiterMemory };

const build = (): Limits => ({
  account: new RateLimiterMemory({ points: TRIES_PER_ACCOUNT, duration: WINDOW_SECONDS }),
  total: new RateLimiterMemory({ points: TRIES_IN_TOTAL, duration: WINDOW_SECONDS }),
});

// On globalThis: the bundles of actions and routes do not share module state.
const store: typeof globalThis & { antiphonAttempts?: Limits } = globalThis;
const limits = () => (store.antiphonAttempts ??= build());

/** Counts a try before the password is looked at; answers the seconds to wait, 0 to go on. A blocked account takes nothing from the total, so that it cannot lock the others out. */
export async function countAttempt(email: string): Promise<number> {
  const wait = await take(limits().account, email);
  return wait > 0 ? wait : take(limits().total, 'all');
}

/** A right password gives its tries back, so that only wrong ones add up. */
export async function forgiveAttempts(email: string): Promise<void> {
  await limits().account.delete(email);
  await limits().total.reward('all', 1);
}

async function take(limiter: RateLimiterMemory, key: string): Promise<number> {
  try {
    await limiter.consume(key);
    return 0;
  } catch (refusal) {
    if (refusal instanceof RateLimiterRes) return Math.max(1, Math.ceil(refusal.msBeforeNext / 1000));
    throw refusal;
  }
}
