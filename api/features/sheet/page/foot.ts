import { LEDGER } from './pen.ts';
import { small, type SheetContext } from './sheet-context.ts';

/** At the foot of every page: which sheet this is, where it stands, and which page of how many. */
export function drawFeet({ pen, edition, address, left, right }: SheetContext, height: number): void {
  const { start, count } = pen.doc.bufferedPageRange();
  const what = edition.edition === null ? `${edition.title}, draft` : `${edition.title}, edition ${edition.edition}`;
  for (let page = 0; page < count; page++) {
    pen.doc.switchToPage(start + page);
    pen.artifact(() => {
      pen.rule(left, right, height - 34, 0.6, LEDGER);
      pen.text(what, small, left, height - 21);
      if (edition.edition !== null) {
        pen.text(address.replace(/^https?:\/\//, ''), small, (left + right) / 2 + 40, height - 21, 'center');
      }
      pen.text(`${page + 1} of ${count}`, small, right, height - 21, 'right');
    });
  }
}
