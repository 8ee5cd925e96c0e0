/** A precondition of the engine is broken (negative width, NaN, unknown bar): the caller's mistake, not a failed check. */
export class InvalidSectionError extends Error {
  readonly path: readonly (string | number)[];

  constructor(message: string, path: readonly (string | number)[]) {
    super(message);
    this.name = 'InvalidSectionError';
    this.path = path;
  }
}

/** @throws InvalidSectionError naming the value unless it is a finite number above zero. */
export function assertPositive(value: number, label: string, path: readonly (string | number)[]): void {
  if (!(value > 0 && value < Infinity))
    throw new InvalidSectionError(`${label} must be a number above zero, not ${value}`, path);
}

/** @throws InvalidSectionError naming the value unless it is a finite number, zero or above. */
export function assertNotNegative(value: number, label: string, path: readonly (string | number)[]): void {
  if (!(value >= 0 && value < Infinity))
    throw new InvalidSectionError(`${label} must be a number, zero or more, not ${value}`, path);
}
