/**
 * A queue of places in a column that gives back the one with the smallest value first, of equals the earliest place.
 *
 * Method: binary heap.
 */
export class ShortestFirst {
  private readonly heap: number[] = [];

  /** @param values may change for a place only while the place is not in the queue. */
  constructor(private readonly values: Float64Array) {}

  add(place: number): void {
    const { heap } = this;
    let at = heap.length;
    heap.push(place);
    while (at > 0) {
      const parent = (at - 1) >> 1;
      if (!this.isBefore(place, heap[parent] as number)) break;
      heap[at] = heap[parent] as number;
      at = parent;
    }
    heap[at] = place;
  }

  /** The next place, or null where none is left. */
  take(): number | null {
    const { heap } = this;
    const top = heap[0];
    const last = heap.pop();
    if (top === undefined || last === undefined) return null;
    if (heap.length === 0) return top;
    let at = 0;
    for (;;) {
      let child = 2 * at + 1;
      if (child >= heap.length) break;
      if (child + 1 < heap.length && this.isBefore(heap[child + 1] as number, heap[child] as number)) child += 1;
      if (!this.isBefore(heap[child] as number, last)) break;
      heap[at] = heap[child] as number;
      at = child;
    }
    heap[at] = last;
    return top;
  }

  private isBefore(a: number, b: number): boolean {
    const [x, y] = [this.values[a] as number, this.values[b] as number];
    return x < y || (x === y && a < b);
  }
}
