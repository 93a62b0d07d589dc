/** Keeps the last `most` values made, by key; the one asked for longest ago goes first. */
export class Kept<Value> {
  readonly #values = new Map<string, Value>();
  constructor(readonly most: number) {}

  get(key: string): Value | undefined {
    const value = this.#values.get(key);
    if (value !== undefined) {
      this.#values.delete(key);
      this.#values.set(key, value);
    }
    return value;
  }

  set(key: string, value: Value): Value {
    this.#values.delete(key);
    this.#values.set(key, value);
    if (this.#values.size > this.most) {
      const oldest = this.#values.keys().next();
      if (!oldest.done) this.#values.delete(oldest.value);
    }
    return value;
  }
}
