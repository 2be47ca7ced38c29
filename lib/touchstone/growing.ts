/** Figures whose number is not known beforehand, without a list of objects. */
export class Growing {
  private kept = new Float64Array(1024);
  length = 0;

  push(value: number): void {
    if (this.length === this.kept.length) {
      const larger = new Float64Array(2 * this.length);
      larger.set(this.kept);
      this.kept = larger;
    }
    this.kept[this.length++] = value;
  }

  /** @param index - below `length` */
  set(index: number, value: number): void {
    this.kept[index] = value;
  }

  at(index: number): number {
    return this.kept[index] ?? NaN;
  }

  values(): Float64Array {
    return this.kept.slice(0, this.length);
  }
}
