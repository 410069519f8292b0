const NONE = -1;

/** Rows of whole numbers, each kept once and numbered in the order in which they came. */
export class StateTable {
  private capacity = 1024;
  private rows: Int32Array;
  private slots = new Int32Array(this.capacity * 2).fill(NONE);
  count = 0;

  constructor(private readonly width: number) {
    this.rows = new Int32Array(this.capacity * width);
  }

  /** The number of an equal row, or -1. */
  find(row: Int32Array): number {
    return this.slots[this.slotOf(row)]!;
  }

  /** Keeps a row that `find` does not know, and numbers it. */
  add(row: Int32Array): number {
    if (this.count === this.capacity) this.grow();
    const number = this.count;
    this.count += 1;
    this.rows.set(row, number * this.width);
    this.slots[this.slotOf(row)] = number;
    return number;
  }

  /** Copies a row out. */
  read(number: number, into: Int32Array): void {
    for (let i = 0, base = number * this.width; i < this.width; i += 1) into[i] = this.rows[base + i]!;
  }

  clear(): void {
    this.count = 0;
    this.slots.fill(NONE);
  }

  private hash(row: Int32Array, from: number): number {
    let mixed = 0x811c9dc5;
    for (let i = 0; i < this.width; i += 1) {
      mixed = Math.imul(mixed ^ row[from + i]!, 0x01000193);
      mixed ^= mixed >>> 15;
    }
    mixed = Math.imul(mixed, 0x2c1b3c6d);
    return (mixed ^ (mixed >>> 13)) >>> 0;
  }

  /** The slot of an equal row, or the free slot where it belongs. */
  private slotOf(row: Int32Array): number {
    const { slots, rows, width } = this;
    const mask = slots.length - 1;
    let slot = this.hash(row, 0) & mask;
    for (;;) {
      const number = slots[slot]!;
      if (number === NONE) return slot;
      let i = 0;
      for (const base = number * width; i < width && rows[base + i] === row[i]; i += 1);
      if (i === width) return slot;
      slot = (slot + 1) & mask;
    }
  }

  private grow(): void {
    this.capacity *= 2;
    const rows = new Int32Array(this.capacity * this.width);
    rows.set(this.rows);
    this.rows = rows;
    this.slots = new Int32Array(this.capacity * 2).fill(NONE);
    const mask = this.slots.length - 1;
    for (let number = 0; number < this.count; number += 1) {
      let slot = this.hash(rows, number * this.width) & mask;
      while (this.slots[slot] !== NONE) slot = (slot + 1) & mask;
      this.slots[slot] = number;
    }
  }
}
