/** Width of the action and warning limits in standard deviations (Shewhart 1931). */
export const ACTION_SIGMAS = 3;
export const WARNING_SIGMAS = 2;

/** One-sided normal tail areas of 3 and 2 standard deviations, rounded as they are tabulated. */
export const ACTION_TAIL = 0.00135;
export const WARNING_TAIL = 0.02275;

/** Relative slack of every "strictly beyond": plain floating point gets touching points wrong. */
export const RELATIVE_SLACK = 1e-12;

/** Below this expected number of events (or of non-events) the normal approximation isn't trusted. */
export const SMALL_COUNT = 5;

/** A run survives this many calendar months without a point in a row, not more. */
export const LONGEST_GAP_MONTHS = 3;

/** Mean range of two normal values in standard deviations (d2 for n = 2), rounded as it is tabulated. */
export const MOVING_RANGE_CONSTANT = 1.128;

/** Run lengths of the rules where an indicator sets none. */
export const ONE_SIDE_LENGTH = 8;
export const TREND_LENGTH = 6;
export const WITHIN_ONE_SIGMA_LENGTH = 15;
