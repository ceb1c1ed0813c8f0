/** Time left of a search; passed in, so that tests can hold it still. */
export type Clock = {
  readonly now: () => number;
  readonly startedAt: number;
  isUp(): boolean;
  secondsLeft(): number;
  elapsedMs(): number;
};

export function makeClock(now: () => number, limitMs: number): Clock {
  const startedAt = now();
  const elapsedMs = () => now() - startedAt;
  return {
    now,
    startedAt,
    elapsedMs,
    isUp: () => elapsedMs() >= limitMs,
    secondsLeft: () => Math.max(0, limitMs - elapsedMs()) / 1000,
  };
}

/** A clock that runs out earlier than another. */
export function shorterClock(clock: Clock, limitMs: number): Clock {
  const startedAt = clock.now();
  const left = () => Math.min(clock.secondsLeft() * 1000, limitMs - (clock.now() - startedAt));
  return { ...clock, isUp: () => left() <= 0, secondsLeft: () => Math.max(0, left()) / 1000 };
}
