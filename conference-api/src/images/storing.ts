const STORING_MINUTES = 10;

/** What has been stored since before this time has been left half-way. */
export const storingSince = (now: Date) => new Date(now.getTime() - STORING_MINUTES * 60_000);
