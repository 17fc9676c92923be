/** npm hands a signal on that the terminal has sent to everybody already: within this time it is one key press told twice. */
const echoMilliseconds = 500;
const parentLookMilliseconds = 1_000;

/**
 * Hear the wish to stop.
 *
 * @param onHurry called at a second wish, which wants no patience
 * @returns {{first: Promise<string>, isHeard(): boolean}} `first` resolves with the name of the first signal
 */
export function hearStopSignals(onHurry) {
  let heardAt;
  const first = new Promise((resolve) => {
    const hear = (signal) => {
      const now = performance.now();
      if (heardAt === undefined) {
        heardAt = now;
        resolve(signal);
      } else if (now - heardAt > echoMilliseconds) {
        onHurry();
      }
    };
    // SIGHUP: the terminal was closed.
    for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => hear(signal));
    // Never a second wish: a Ctrl-C ends npm's shell too.
    whenNpmIsGone(() => heardAt ?? hear('npm is gone'));
  });
  return { first, isHeard: () => heardAt !== undefined };
}

/** npm that is told to end takes its shell along, but not us: no event tells, only that our parent is another one. */
function whenNpmIsGone(onGone) {
  if (process.env.npm_lifecycle_event === undefined) return;
  const parent = process.ppid;
  const timer = setInterval(() => {
    if (process.ppid === parent) return;
    clearInterval(timer);
    onGone();
  }, parentLookMilliseconds);
  timer.unref();
}
