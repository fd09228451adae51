import type { PublicEdition, PublicLine, PublicPiece, Terms } from '#crochet';
import { html, type Html } from './html.ts';
import { momentText } from './moments.ts';

const WORKED = { spiral: 'in a spiral', joined: 'in joined rounds', rows: 'worked flat' } as const;

/** "24 each", "12 dc, 4 ch-2 sps". */
export function totalText(line: Pick<PublicLine, 'total' | 'each'>, terms: Terms): string {
  return line.total ? `${line.total[terms]}${line.each ? ' each' : ''}` : '';
}

function lineHtml(line: PublicLine, terms: Terms): Html {
  const total = totalText(line, terms);
  const at = line.mark && html`<a href="${momentLink(line.mark)}">${momentText(line.mark)}</a>`;
  const note = line.note[terms];
  return html`<li id="${line.shortId}" class="watch-line watch-line-${line.kind}">
    <b class="watch-line-label">${line.label}</b>
    <span class="watch-line-text"
      >${line.text[terms]}${note !== '' && html` <span class="watch-line-note">${note}</span>`}</span
    >
    <span class="watch-line-total">${total}</span>
    <span class="watch-line-at">${at}</span>
  </li>`;
}

/** Address of a moment on this page; it works without a script, since it names the clip's time. */
export function momentLink({ recordingNumber, startMs }: { recordingNumber: number; startMs: number }): string {
  const seconds = Math.floor(startMs / 1000);
  return recordingNumber === 1 ? `?t=${seconds}` : `?r=${recordingNumber}&t=${seconds}`;
}

function pieceHtml(piece: PublicPiece, terms: Terms): Html {
  return html`<section class="watch-piece">
    <h2>${piece.name} <small>make ${piece.make}, ${WORKED[piece.worked]}</small></h2>
    <ol class="watch-lines">
      ${piece.lines.map((line) => lineHtml(line, terms))}
    </ol>
  </section>`;
}

/** Every piece with every line, its total and its moment: the whole pattern, without a script. */
export const patternHtml = (edition: PublicEdition): Html =>
  html`${edition.pieces.map((piece) => pieceHtml(piece, edition.terms))}`;
