/** The facts behind a numeric failure, by name. */
export type ErrorFacts = Readonly<Record<string, number | string>>;

/** Arrays or sizes that do not fit together. */
export class DimensionError extends Error {
  override readonly name: string = 'DimensionError';
  readonly facts: ErrorFacts;
  constructor(message: string, facts: ErrorFacts = {}) {
    super(message);
    this.facts = facts;
  }
}

/** A value outside the domain of a function. */
export class DomainError extends Error {
  override readonly name: string = 'DomainError';
  readonly facts: ErrorFacts;
  constructor(message: string, facts: ErrorFacts = {}) {
    super(message);
    this.facts = facts;
  }
}

/** An iteration or factorisation that could not be carried through. */
export class ConvergenceError extends Error {
  override readonly name: string = 'ConvergenceError';
  readonly facts: ErrorFacts;
  constructor(message: string, facts: ErrorFacts = {}) {
    super(message);
    this.facts = facts;
  }
}
