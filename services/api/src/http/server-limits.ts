/** How long a request may take to arrive: a slow sender must not hold what others need. */
export const serverLimits = {
  /** Milliseconds for the whole of it; a file of 50 MB at 4 Mbit/s takes 100 s. */
  requestTimeout: 120_000,
  headersTimeout: 20_000,
} as const;
