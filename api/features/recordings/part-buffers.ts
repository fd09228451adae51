/** Parts that a process holds in memory at a time; more wait at the door with their bytes still on the wire. */
export const PARTS_IN_HAND = 6;

interface Waiting {
  readonly owner: string;
  readonly hand: (buffer: Buffer) => void;
}

/**
 * A handful of buffers that go round: whoever holds one may read a part into it. Memory stays the same however many
 * people send at once. Of those who wait, the one who holds the fewest is served first, so that one person on a slow
 * line does not keep the others out.
 */
export class PartBuffers {
  readonly #free: Buffer[] = [];
  readonly #size: number;
  readonly #held = new Map<string, number>();
  #made = 0;
  #waiting: Waiting[] = [];

  /** @param size bytes of the largest part */
  constructor(size: number) {
    this.#size = size;
  }

  /** Waits for a buffer; each one taken is given back with `giveBack`. */
  async take(owner: string): Promise<Buffer> {
    const free = this.#free.pop() ?? this.#make();
    const buffer = free ?? (await new Promise<Buffer>((hand) => this.#waiting.push({ owner, hand })));
    this.#held.set(owner, this.#heldBy(owner) + 1);
    return buffer;
  }

  giveBack(owner: string, buffer: Buffer): void {
    const left = this.#heldBy(owner) - 1;
    if (left > 0) this.#held.set(owner, left);
    else this.#held.delete(owner);
    const next = this.#waiting.reduce<Waiting | undefined>(
      (best, each) => (best === undefined || this.#heldBy(each.owner) < this.#heldBy(best.owner) ? each : best),
      undefined,
    );
    if (!next) {
      this.#free.push(buffer);
      return;
    }
    this.#waiting = this.#waiting.filter((each) => each !== next);
    next.hand(buffer);
  }

  #heldBy(owner: string): number {
    return this.#held.get(owner) ?? 0;
  }

  #make(): Buffer | undefined {
    if (this.#made === PARTS_IN_HAND) return undefined;
    this.#made += 1;
    return Buffer.allocUnsafeSlow(this.#size);
  }
}
