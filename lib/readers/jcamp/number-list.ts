/** Numbers collected without knowing how many come: a typed array that grows. */
export class NumberList {
  private store: Float64Array<ArrayBuffer> = new Float64Array(256);
  length = 0;

  push(value: number): void {
    if (this.length === this.store.length) {
      const bigger = new Float64Array(this.store.length * 2);
      bigger.set(this.store);
      this.store = bigger;
    }
    this.store[this.length] = value;
    this.length += 1;
  }

  at(index: number): number {
    return index >= 0 && index < this.length ? (this.store[index] ?? NaN) : NaN;
  }

  set(index: number, value: number): void {
    if (index >= 0 && index < this.length) this.store[index] = value;
  }

  toArray(): Float64Array {
    return this.store.slice(0, this.length);
  }
}
