const SECOND = 1000;
/** Failures are forgotten this long after the first of them. */
const WINDOW = 60 * 60 * SECOND;
const FIRST_BLOCK = 30 * SECOND;
const LONGEST_BLOCK = 15 * 60 * SECOND;

/** Tries that are free within a window, by what they are counted for. An address may be a whole hospital's. */
export const freeTries = { email: 10, address: 100 } as const;

export interface ThrottleState {
  failures: number;
  windowStartedAt: Date;
  blockedUntil: Date | null;
}

/** Seconds until the next try is taken; 0 where it is taken now. */
export function secondsBlocked(state: ThrottleState, now: Date): number {
  if (!state.blockedUntil || state.blockedUntil <= now) return 0;
  return Math.ceil((state.blockedUntil.valueOf() - now.valueOf()) / SECOND);
}

/**
 * The state once one more try counts as failed. From the last free one on each try blocks the next, for twice as
 * long every time, so that guessing gets slow while a forgetful person only waits a little.
 */
export function countFailure(state: ThrottleState, now: Date, free: number): ThrottleState {
  const isOver = now.valueOf() - state.windowStartedAt.valueOf() >= WINDOW;
  const failures = (isOver ? 0 : state.failures) + 1;
  const beyond = failures - free;
  const block = beyond < 0 ? null : Math.min(LONGEST_BLOCK, FIRST_BLOCK * 2 ** Math.min(beyond, 10));
  return {
    failures,
    windowStartedAt: isOver ? now : state.windowStartedAt,
    blockedUntil: block === null ? null : new Date(now.valueOf() + block),
  };
}

/** The state once a counted try turned out right: that one is taken back, earlier failures stand. */
export function takeBack(state: ThrottleState, free: number): ThrottleState {
  const failures = Math.max(0, state.failures - 1);
  return { ...state, failures, blockedUntil: failures < free ? null : state.blockedUntil };
}
