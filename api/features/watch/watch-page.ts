import type { PublicEdition } from '#crochet';
import { aboutHtml } from './about-html.ts';
import { html, jsonScript, type Html } from './html.ts';
import { MARK } from './mark-svg.ts';
import { momentLink, patternHtml, totalText } from './pattern-html.ts';

export interface WatchPage {
  readonly edition: PublicEdition;
  readonly number: number;
  /** Address of this edition's page, whole. */
  readonly address: string;
  /** Number of the edition that is current, and the pattern's lasting path. */
  readonly currentNumber: number;
  readonly path: string;
  readonly isListed: boolean;
  readonly withdrawnReason: string | null;
  readonly assets: Html;
}

const byLine = ({ maker, studio }: PublicEdition) => (maker === '' ? studio.name : `${maker}, ${studio.name}`);

/** The outer page every public page shares. Follows the system's light or dark before anything is drawn. */
export function publicPage(options: { readonly title: string; readonly head: Html; readonly body: Html }): string {
  const page = html`<html lang="en">
    <head>
      <meta charset="utf-8" />
      <meta name="viewport" content="width=device-width, initial-scale=1, viewport-fit=cover" />
      <meta name="theme-color" content="#173850" />
      <meta name="color-scheme" content="light dark" />
      <link rel="icon" href="/mark.svg" type="image/svg+xml" />
      <title>${options.title}</title>
      <script src="/light.js"></script>
      ${options.head}
    </head>
    <body class="watch">
      <div class="watch-edge cloth running-stitch" aria-hidden="true"></div>
      ${options.body}
    </body>
  </html>`;
  return `<!doctype html>\n${page.text}\n`;
}

function stage(page: WatchPage): Html {
  const recording = page.edition.recordings.find(({ hasClip }) => hasClip);
  if (!recording) {
    const elsewhere = page.edition.recordings.find(({ publicUrl }) => publicUrl !== null);
    return html`<p class="watch-no-clip">
      ${
        elsewhere
          ? html`The recording stands <a href="${elsewhere.publicUrl}" rel="noopener">at another address</a>.`
          : 'There is no clip with this pattern. The words below are the whole of it.'
      }
    </p>`;
  }
  const from = `/api/editions/${page.edition.code}/${page.number}`;
  const captioned = page.edition.captions.some((caption) => caption.recordingNumber === recording.number);
  return html`<video controls playsinline preload="metadata" src="${from}/clips/${recording.number}">
    ${captioned && html`<track kind="captions" srclang="en" label="Captions" src="${from}/captions/${recording.number}" />`}
  </video>`;
}

/** The first line, so that the page has its shape before the script runs; the script takes it from here. */
function work({ edition }: WatchPage): Html {
  const piece = edition.pieces.find(({ lines }) => lines.length > 0);
  const line = piece?.lines[0];
  if (!piece || !line) return html`<p>This pattern has no line yet.</p>`;
  const total = totalText(line, edition.terms);
  return html`<p class="watch-where"><b>${line.label === '' ? 'First' : line.label}, ${piece.name}</b></p>
    <p class="watch-now"><span>${line.text[edition.terms]}</span> <strong>${total}</strong></p>
    ${line.mark && html`<p><a href="${momentLink(line.mark)}">See it in the recording</a></p>`}`;
}

function notices(page: WatchPage): Html {
  const newer = page.currentNumber > page.number;
  return html`${
    page.withdrawnReason !== null &&
    html`<p class="watch-notice" role="note">
      <b>This edition was withdrawn.</b> ${page.withdrawnReason}
      ${newer && html`<a href="${page.path}">Go to edition ${page.currentNumber}</a>`}
    </p>`
  }
  ${
    page.withdrawnReason === null &&
    newer &&
    html`<p class="watch-notice" role="note">
      This is edition ${page.number}. <a href="${page.path}">Edition ${page.currentNumber} is out</a>; ticks made here
      stay here.
    </p>`
  }`;
}

/** The watch page: the whole pattern as words, with places that the page's script brings to life. */
export function watchPage(page: WatchPage): string {
  const { edition, number } = page;
  const title = `${edition.title}, ${byLine(edition)}`;
  const sheet = `/api/editions/${edition.code}/${number}/sheet.pdf`;
  const description = edition.details.introduction.replace(/\s+/g, ' ').slice(0, 200);
  return publicPage({
    title,
    head: html`${!page.isListed && html`<meta name="robots" content="noindex" />`}
      ${description !== '' && html`<meta name="description" content="${description}" />`}
      <link rel="canonical" href="${page.address}" />
      ${page.assets}`,
    body: html`<div class="watch-page">
        <a class="watch-skip" href="#work">To the line being worked</a>
        <header class="watch-strip">
          ${MARK}
          <h1>${edition.title}</h1>
          <span class="watch-by">by ${byLine(edition)}. Edition ${number}</span>
          <div class="watch-tools" data-island="tools"><a class="btn" href="${sheet}">Print sheet</a></div>
        </header>
        ${notices(page)}
        <main>
          <div class="watch-main">
            <section class="watch-stage" data-island="stage" aria-label="Recording">${stage(page)}</section>
            <section class="watch-work" id="work" data-island="work" aria-label="The line being worked">
              ${work(page)}
            </section>
            <section class="watch-rounds" data-island="rounds" aria-label="All lines">${patternHtml(edition)}</section>
          </div>
          ${aboutHtml(edition)}
          <div data-island="dock"></div>
        </main>
        <footer class="watch-foot">
          ${edition.title}, edition ${number}. <a href="${sheet}">The sheet as PDF</a>. Made with Roundelay.
        </footer>
      </div>
      ${jsonScript('edition', edition)}`,
  });
}

/** The same page for every address that names nothing one may see. */
export function nothingHere(assets: Html): string {
  return publicPage({
    title: 'No such page',
    head: html`<meta name="robots" content="noindex" />${assets}`,
    body: html`<main class="watch-page watch-nothing">
      ${MARK}
      <h1>There is no such page, or it is not shared</h1>
      <p>
        Look at the address on your sheet again: its letters count. A pattern that its maker took back or keeps private
        shows nothing here.
      </p>
    </main>`,
  });
}

/** A page for when something of ours fails: what is so, and what to do. */
export function trouble(): string {
  return publicPage({
    title: 'Not at the moment',
    head: html`<meta name="robots" content="noindex" />`,
    body: html`<main class="watch-page watch-nothing">
      ${MARK}
      <h1>This page cannot be shown at the moment</h1>
      <p>Nothing was lost, and your ticks are kept in this browser. Try again in a minute.</p>
    </main>`,
  });
}
