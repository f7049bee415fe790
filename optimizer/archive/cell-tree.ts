/**
 * An index of grid cells that answers the two questions an archive asks for every design: is there a cell at most this one in all
 * coordinates, and which cells are at least this one? A k-d tree with buckets and bounding boxes (after Bentley 1975; the boxes cut both
 * searches short as in the ND-tree of Jaszkiewicz, Lust 2018). Kernel: long on purpose.
 *
 * Boxes only grow until the next rebuild, which comes when the number of cells has doubled or as many have gone as there were.
 */

/** Cells in one leaf before it splits. */
const BUCKET = 16;

/** Index over cells given by slot: the cell of slot s is cells[s·m … s·m + m). */
export class CellTree {
  private readonly m: number;
  private cells: Float64Array;
  /** Boxes of the nodes, low then high corner. */
  private boxes: Float64Array;
  /** First of a node's two children, which stand side by side; −1 for a leaf. */
  private child: Int32Array;
  private parent: Int32Array;
  private axis: Int32Array;
  private cut: Float64Array;
  /** Cells below a node. */
  private live: Int32Array;
  private bucket: Int32Array;
  private leafOf: Int32Array;
  private nodes = 0;
  private builtWith = 0;
  private removals = 0;
  /** The slot that answered the last `atMost`: the next candidate is often beaten by it too. */
  private recent = -1;

  constructor(m: number, cells: Float64Array) {
    this.m = m;
    this.cells = cells;
    const room = 64;
    this.boxes = new Float64Array(room * 2 * m);
    this.child = new Int32Array(room);
    this.parent = new Int32Array(room);
    this.axis = new Int32Array(room);
    this.cut = new Float64Array(room);
    this.live = new Int32Array(room);
    this.bucket = new Int32Array(room * BUCKET);
    this.leafOf = new Int32Array(cells.length / m).fill(-1);
    this.newNode(-1);
  }

  /** Number of cells held. */
  get count(): number {
    return this.live[0];
  }

  /** Follows the owner of the cells to its larger array. */
  useCells(cells: Float64Array): void {
    this.cells = cells;
    const larger = new Int32Array(cells.length / this.m).fill(-1);
    larger.set(this.leafOf);
    this.leafOf = larger;
  }

  /** Removes every slot, and is then as good as new. */
  clear(): void {
    this.nodes = 0;
    this.newNode(-1);
    this.leafOf.fill(-1);
    this.builtWith = 0;
    this.removals = 0;
    this.recent = -1;
  }

  has(slot: number): boolean {
    return this.leafOf[slot] >= 0;
  }

  /** A slot whose cell is at most `query` in every coordinate, or −1. */
  atMost(query: Float64Array): number {
    const { recent } = this;
    if (recent >= 0 && this.leafOf[recent] >= 0 && this.isAtMost(recent, query)) return recent;
    const found = this.searchAtMost(0, query);
    if (found >= 0) this.recent = found;
    return found;
  }

  /** Adds a slot that is not in the tree. */
  insert(slot: number): void {
    if (this.live[0] > 2 * this.builtWith + 64 || this.removals > this.builtWith + 64) this.rebuild();
    this.place(0, slot);
  }

  /** Removes all slots whose cell is at least `query` in every coordinate, listing them in `removed`; returns how many. */
  removeAtLeast(query: Float64Array, removed: number[]): number {
    removed.length = 0;
    this.collectAtLeast(0, query, removed);
    for (const slot of removed) this.remove(slot);
    return removed.length;
  }

  /** Slots held, in no particular order. */
  slots(): number[] {
    const found: number[] = [];
    for (let slot = 0; slot < this.leafOf.length; slot++) if (this.leafOf[slot] >= 0) found.push(slot);
    return found;
  }

  private isAtMost(slot: number, query: Float64Array): boolean {
    const { m, cells } = this;
    for (let c = 0, at = slot * m; c < m; c++) if (cells[at + c] > query[c]) return false;
    return true;
  }

  private searchAtMost(node: number, query: Float64Array): number {
    const { m, boxes, child, bucket } = this;
    const count = this.live[node];
    if (count === 0) return -1;
    const low = node * 2 * m;
    let whole = true;
    for (let c = 0; c < m; c++) {
      if (boxes[low + c] > query[c]) return -1;
      if (boxes[low + m + c] > query[c]) whole = false;
    }
    const first = child[node];
    if (first < 0) {
      const at = node * BUCKET;
      if (whole) return bucket[at];
      for (let k = 0; k < count; k++) if (this.isAtMost(bucket[at + k], query)) return bucket[at + k];
      return -1;
    }
    const found = this.searchAtMost(first, query);
    return found >= 0 ? found : this.searchAtMost(first + 1, query);
  }

  private collectAtLeast(node: number, query: Float64Array, found: number[]): void {
    const { m, boxes, child, bucket, cells } = this;
    const count = this.live[node];
    if (count === 0) return;
    const high = node * 2 * m + m;
    for (let c = 0; c < m; c++) if (boxes[high + c] < query[c]) return;
    const first = child[node];
    if (first >= 0) {
      this.collectAtLeast(first, query, found);
      this.collectAtLeast(first + 1, query, found);
      return;
    }
    for (let k = 0; k < count; k++) {
      const slot = bucket[node * BUCKET + k];
      let c = 0;
      while (c < m && cells[slot * m + c] >= query[c]) c++;
      if (c === m) found.push(slot);
    }
  }

  private remove(slot: number): void {
    const { bucket, live, parent } = this;
    const leaf = this.leafOf[slot];
    const at = leaf * BUCKET;
    let k = 0;
    while (bucket[at + k] !== slot) k++;
    bucket[at + k] = bucket[at + live[leaf] - 1];
    this.leafOf[slot] = -1;
    for (let node = leaf; node >= 0; node = parent[node]) live[node]--;
    this.removals++;
  }

  private place(from: number, slot: number): void {
    const { m, cells } = this;
    let node = from;
    for (;;) {
      this.include(node, slot);
      if (this.child[node] < 0) {
        if (this.live[node] < BUCKET) break;
        this.split(node);
        // Cells are distinct, so a full leaf always splits.
      }
      this.live[node]++;
      node = this.child[node] + (cells[slot * m + this.axis[node]] <= this.cut[node] ? 0 : 1);
    }
    this.bucket[node * BUCKET + this.live[node]++] = slot;
    this.leafOf[slot] = node;
  }

  private include(node: number, slot: number): void {
    const { m, boxes, cells } = this;
    const low = node * 2 * m;
    for (let c = 0; c < m; c++) {
      const value = cells[slot * m + c];
      if (value < boxes[low + c]) boxes[low + c] = value;
      if (value > boxes[low + m + c]) boxes[low + m + c] = value;
    }
  }

  /** Turns a full leaf into a node with two leaves, cut in the middle of its cells along the axis they spread most on. */
  private split(node: number): void {
    const { m, cells } = this;
    let axis = 0;
    let widest = -1;
    let cut = 0;
    for (let c = 0; c < m; c++) {
      let low = Number.POSITIVE_INFINITY;
      let high = Number.NEGATIVE_INFINITY;
      for (let k = 0; k < BUCKET; k++) {
        const value = cells[this.bucket[node * BUCKET + k] * m + c];
        if (value < low) low = value;
        if (value > high) high = value;
      }
      if (high - low > widest) {
        widest = high - low;
        axis = c;
        cut = Math.min(low + widest / 2, high - widest / 4);
      }
    }
    const first = this.newNode(node);
    this.newNode(node);
    this.axis[node] = axis;
    this.cut[node] = cut;
    this.child[node] = first;
    for (let k = 0; k < BUCKET; k++) {
      const slot = this.bucket[node * BUCKET + k];
      const leaf = first + (cells[slot * m + axis] <= cut ? 0 : 1);
      this.include(leaf, slot);
      this.bucket[leaf * BUCKET + this.live[leaf]++] = slot;
      this.leafOf[slot] = leaf;
    }
  }

  private newNode(parent: number): number {
    if (this.nodes === this.child.length) this.grow();
    const node = this.nodes++;
    const low = node * 2 * this.m;
    this.boxes.fill(Number.POSITIVE_INFINITY, low, low + this.m);
    this.boxes.fill(Number.NEGATIVE_INFINITY, low + this.m, low + 2 * this.m);
    this.child[node] = -1;
    this.parent[node] = parent;
    this.live[node] = 0;
    return node;
  }

  private grow(): void {
    this.boxes = doubled(this.boxes, new Float64Array(2 * this.boxes.length));
    this.cut = doubled(this.cut, new Float64Array(2 * this.cut.length));
    this.child = doubled(this.child, new Int32Array(2 * this.child.length));
    this.parent = doubled(this.parent, new Int32Array(2 * this.parent.length));
    this.axis = doubled(this.axis, new Int32Array(2 * this.axis.length));
    this.live = doubled(this.live, new Int32Array(2 * this.live.length));
    this.bucket = doubled(this.bucket, new Int32Array(2 * this.bucket.length));
  }

  /** Builds the tree anew. Inserting in an order that strides over the slots keeps the cuts near the middle. */
  private rebuild(): void {
    const slots = this.slots();
    this.nodes = 0;
    this.newNode(-1);
    this.leafOf.fill(-1);
    this.builtWith = slots.length;
    this.removals = 0;
    const stride = coprimeStride(slots.length);
    for (let k = 0, at = 0; k < slots.length; k++, at = (at + stride) % slots.length) this.place(0, slots[at]);
  }
}

function doubled<T extends Float64Array | Int32Array>(from: T, to: T): T {
  to.set(from);
  return to;
}

/** A step of about 0.618 of `length` that visits every index once. */
function coprimeStride(length: number): number {
  let stride = Math.max(1, Math.floor(length * 0.618));
  while (greatestDivisor(stride, length) !== 1) stride++;
  return stride;
}

function greatestDivisor(a: number, b: number): number {
  return b === 0 ? a : greatestDivisor(b, a % b);
}
