const MINUTE = 60 * 1000;

/** Without a request for this long a session ends by itself. */
export const IDLE_LIMIT = 30 * MINUTE;

/** However busy, a session ends this long after signing in. */
export const ABSOLUTE_LIMIT = 12 * 60 * MINUTE;
