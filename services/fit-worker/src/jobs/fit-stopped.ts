/** Why a running fit was told to stop. */
export type StopReason = 'cancel-requested' | 'fenced' | 'shutdown';

/** A fit was stopped from outside. Not a failure: what follows from it is decided by the reason. */
export class FitStopped extends Error {
  override readonly name = 'FitStopped';
  readonly reason: StopReason;

  constructor(reason: StopReason) {
    super(`the fit was stopped: ${reason}`);
    this.reason = reason;
  }
}
