import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { paginate, type Block } from '../../../api/features/sheet/page/paginate.ts';

const TOP = 30;
const BOTTOM = 790;
const noDraw = () => undefined;
const running = { height: 19, draw: () => undefined };

const blocks = fc.array(
  fc.record({
    height: fc.integer({ min: 5, max: 120 }),
    keepNext: fc.integer({ min: 0, max: 3 }),
    isRow: fc.boolean(),
  }),
  { minLength: 1, maxLength: 120 },
);
const made = (list: readonly { height: number; keepNext: number; isRow: boolean }[]): Block[] =>
  list.map(({ height, keepNext, isRow }) => ({
    height,
    keepNext: isRow ? 0 : keepNext,
    running: isRow ? running : null,
    draw: noDraw,
  }));

describe('breaking a sheet into pages', () => {
  test('places every block once, in order, within its page, over nothing else', () => {
    fc.assert(
      fc.property(blocks, (list) => {
        const wanted = made(list);
        const placed = paginate(wanted, TOP, BOTTOM);
        expect(placed.filter(({ draw }) => draw === noDraw)).toHaveLength(wanted.length);
        let [page, y] = [0, TOP];
        for (const one of placed) {
          if (one.page > page) [page, y] = [one.page, TOP];
          expect(one.page).toBe(page);
          expect(one.y).toBeGreaterThanOrEqual(y - 0.01);
          y = one.y;
        }
      }),
    );
  });

  test('keeps a heading on the page of the lines that must stand with it', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 15, max: 60 }), { minLength: 0, maxLength: 60 }), (heights) => {
        const names: string[] = [];
        const block = (name: string, height: number, keepNext = 0): Block => ({
          height,
          keepNext,
          draw: () => names.push(name),
        });
        const list = [
          ...heights.map((height) => block('row', height)),
          block('head', 20, 3),
          block('a', 17),
          block('b', 17),
          block('c', 17),
        ];
        const placed = paginate(list, TOP, BOTTOM).slice(-4);
        expect(new Set(placed.map(({ page }) => page)).size).toBe(1);
      }),
    );
  });

  test('repeats the running head where a page begins inside a section, and nowhere else', () => {
    const heads: number[] = [];
    const head = { height: 19, draw: (y: number) => heads.push(y) };
    const rows: Block[] = Array.from({ length: 100 }, () => ({ height: 17, running: head, draw: noDraw }));
    const placed = paginate(rows, TOP, BOTTOM);
    for (const { draw, y } of placed) draw(y);
    const pages = Math.max(...placed.map(({ page }) => page));
    expect(pages).toBe(2);
    expect(heads).toEqual(Array(pages).fill(TOP));
  });

  test('does not hang on a block taller than a page', () => {
    expect(
      paginate(
        [
          { height: 2_000, draw: noDraw, keepNext: 1 },
          { height: 10, draw: noDraw },
        ],
        TOP,
        BOTTOM,
      ),
    ).toMatchObject([
      { page: 0, y: TOP },
      { page: 1, y: TOP },
    ]);
  });
});
