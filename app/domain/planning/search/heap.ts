/** A binary heap of numbered things, least key first; of equal keys the one that `goesFirst` names. */
export class Heap {
  private keys = new Float64Array(1024);
  private nodes = new Int32Array(1024);
  size = 0;

  constructor(private readonly goesFirst: (a: number, b: number) => boolean) {}

  private before(key: number, node: number, at: number): boolean {
    const other = this.keys[at]!;
    return key < other || (key === other && this.goesFirst(node, this.nodes[at]!));
  }

  push(key: number, node: number): void {
    if (this.size === this.keys.length) this.grow();
    let at = this.size;
    this.size += 1;
    while (at > 0) {
      const up = (at - 1) >> 1;
      if (!this.before(key, node, up)) break;
      this.keys[at] = this.keys[up]!;
      this.nodes[at] = this.nodes[up]!;
      at = up;
    }
    this.keys[at] = key;
    this.nodes[at] = node;
  }

  /** `Infinity` when empty. */
  leastKey(): number {
    return this.size > 0 ? this.keys[0]! : Number.POSITIVE_INFINITY;
  }

  pop(): number {
    const top = this.nodes[0]!;
    this.size -= 1;
    const key = this.keys[this.size]!;
    const node = this.nodes[this.size]!;
    let at = 0;
    for (;;) {
      let down = at * 2 + 1;
      if (down >= this.size) break;
      const right = down + 1;
      if (right < this.size && this.before(this.keys[right]!, this.nodes[right]!, down)) down = right;
      if (this.before(key, node, down)) break;
      this.keys[at] = this.keys[down]!;
      this.nodes[at] = this.nodes[down]!;
      at = down;
    }
    this.keys[at] = key;
    this.nodes[at] = node;
    return top;
  }

  private grow(): void {
    const keys = new Float64Array(this.size * 2);
    keys.set(this.keys);
    this.keys = keys;
    const nodes = new Int32Array(this.size * 2);
    nodes.set(this.nodes);
    this.nodes = nodes;
  }
}
