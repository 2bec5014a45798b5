/** A column of numbers that grows: memory is what the numbers take, at most twice over while it grows. */
export class GrowableColumn {
  private buffer = new Float64Array(4096);
  private size = 0;

  push(value: number): void {
    if (this.size === this.buffer.length) {
      const larger = new Float64Array(this.buffer.length * 2);
      larger.set(this.buffer);
      this.buffer = larger;
    }
    this.buffer[this.size] = value;
    this.size += 1;
  }

  get length(): number {
    return this.size;
  }

  /** The numbers themselves; the column must not grow afterwards. */
  values(): Float64Array {
    return this.buffer.subarray(0, this.size);
  }
}
