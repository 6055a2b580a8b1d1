/** Where the time comes from, so that tests can turn it. */
export interface Clock {
  now(): Date;
}

export const systemClock: Clock = { now: () => new Date() };
