/** A map that keeps no more than so many values: the one longest unused goes first. */
export class Kept<Key, Value> {
  private readonly values = new Map<Key, Value>();

  /** @param most - how many values are kept, at least 1 */
  constructor(private readonly most: number) {}

  /** The value, now the latest used; undefined when it was never put or has gone. */
  get(key: Key): Value | undefined {
    const value = this.values.get(key);
    if (value === undefined) return undefined;
    this.values.delete(key);
    this.values.set(key, value);
    return value;
  }

  put(key: Key, value: Value): Value {
    this.values.delete(key);
    this.values.set(key, value);
    const [oldest] = this.values.keys();
    if (this.values.size > this.most && oldest !== undefined) this.values.delete(oldest);
    return value;
  }

  /** Everything kept, the longest unused first. */
  entries(): IterableIterator<[Key, Value]> {
    return this.values.entries();
  }
}
