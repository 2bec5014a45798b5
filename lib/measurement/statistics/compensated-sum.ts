/**
 * The sum of numbers with Neumaier's compensation, so that small terms beside large ones are not lost.
 *
 * Method: Neumaier (1974), improved Kahan–Babuška summation.
 * @param values any length; the sum of none is 0. A term that is NaN or infinite makes the sum NaN.
 * @example compensatedSum([1, 1e100, 1, -1e100]) // 2
 */
export function compensatedSum(values: ArrayLike<number>): number {
  const sum = new CompensatedSum();
  for (let i = 0; i < values.length; i += 1) sum.add(values[i] as number);
  return sum.value;
}

/** The same, a term at a time. */
export class CompensatedSum {
  private total = 0;
  private lost = 0;

  add(term: number): void {
    const next = this.total + term;
    this.lost += Math.abs(this.total) >= Math.abs(term) ? this.total - next + term : term - next + this.total;
    this.total = next;
  }

  get value(): number {
    return this.total + this.lost;
  }
}
