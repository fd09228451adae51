/** A stretch of a sheet that is never broken: a heading, a line of the ledger, a paragraph's line. */
export interface Block {
  /** In points, the space above it included. */
  readonly height: number;
  /** The number of blocks after this one that must stand on the same page as it. */
  readonly keepNext?: number;
  /** What is repeated at the head of a page that begins inside this block's section. */
  readonly running?: Running | null;
  /** Draws with its top at `y`. */
  readonly draw: (y: number) => void;
}

export interface Running {
  readonly height: number;
  readonly draw: (y: number) => void;
}

export interface PlacedBlock {
  readonly page: number;
  readonly y: number;
  readonly draw: (y: number) => void;
}

/** Height of a block with everything it must stand together with. */
function unit(blocks: readonly Block[], index: number): number {
  let height = 0;
  let last = index;
  for (let i = index; i <= last && i < blocks.length; i++) {
    height += blocks[i]?.height ?? 0;
    last = Math.max(last, i + (blocks[i]?.keepNext ?? 0));
  }
  return height;
}

/**
 * Gives each block its page and place. A block goes to the next page where it, or what it must stand together with,
 * no longer fits; a page that begins inside a section begins with the section's running head.
 *
 * @param top,bottom the column's upper and lower edge, in points from the top of the page
 */
export function paginate(blocks: readonly Block[], top: number, bottom: number): readonly PlacedBlock[] {
  const placed: PlacedBlock[] = [];
  let page = 0;
  let y = top;
  blocks.forEach((block, index) => {
    const needed = Math.min(unit(blocks, index), bottom - top);
    const kept = index > 0 && keptByEarlier(blocks, index);
    if (y > top && y + (kept ? block.height : needed) > bottom + 0.01) {
      page++;
      y = top;
      if (block.running) {
        placed.push({ page, y, draw: block.running.draw });
        y += block.running.height;
      }
    }
    placed.push({ page, y, draw: block.draw });
    y += block.height;
  });
  return placed;
}

/** Whether an earlier block has already made room for this one. */
function keptByEarlier(blocks: readonly Block[], index: number): boolean {
  for (let i = index - 1; i >= 0 && i >= index - 4; i--) {
    if (i + (blocks[i]?.keepNext ?? 0) >= index) return true;
  }
  return false;
}
