/** A failure that a person can mend: shown as its message alone, without a stack. */
export class LaunchError extends Error {
  /** @param {string} message what happened and what to do */
  constructor(message) {
    super(message);
    this.name = 'LaunchError';
  }
}
