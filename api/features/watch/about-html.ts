import type { Erratum, PublicEdition } from '#crochet';
import { html, type Html } from './html.ts';

type Body = Html | readonly Html[] | string;

/** A section with its heading; nothing where there is nothing to say. */
const part = (heading: string, body: Body, isEmpty: boolean): Html | null =>
  isEmpty
    ? null
    : html`<section>
        <h2>${heading}</h2>
        ${body}
      </section>`;

const words = (text: string): Html[] =>
  text
    .split(/\r?\n/)
    .filter((line) => line.trim() !== '')
    .map((line) => html`<p>${line}</p>`);

const list = (items: readonly Html[]): Html =>
  html`<ul>
    ${items.map((item) => html`<li>${item}</li>`)}
  </ul>`;

function abbreviations({ abbreviations: used, terms }: PublicEdition): Html {
  const other = terms === 'US' ? 'UK' : 'US';
  return html`<table class="watch-table">
    <thead>
      <tr>
        <th scope="col">${terms}</th>
        <th scope="col">name</th>
        <th scope="col">${other}</th>
      </tr>
    </thead>
    <tbody>
      ${used.map(
        ({ abbreviation, name }) =>
          html`<tr>
            <th scope="row">${abbreviation[terms]}</th>
            <td>${name[terms]}</td>
            <td>${abbreviation[other]}</td>
          </tr>`,
      )}
    </tbody>
  </table>`;
}

function erratum({ place, was, now, why }: Erratum): Html {
  const change =
    now === ''
      ? html`was <s>${was}</s>, now left out`
      : was === ''
        ? html`new: ${now}`
        : html`<s>${was}</s> now reads <b>${now}</b>`;
  return html`<b>${place}:</b> ${change}${why !== '' && html` (${why})`}`;
}

/** The cautions in the page's only full double frame, with the sentence that defers to the rules where one lives. */
export function cautionsHtml({ cautions, deferral }: PublicEdition): Html {
  const said = cautions.map(({ title, text }) => html`${title !== '' && html`<b>${title}.</b> `}${text} `);
  return html`<section class="double-frame watch-cautions">
    <h2>Cautions</h2>
    <p>${said}${deferral}</p>
  </section>`;
}

/** What is needed before starting, and what may be done with it afterwards. */
export function aboutHtml(edition: PublicEdition): Html {
  const { details, terms, materials, specialStitches, notes, errata } = edition;
  const told = errata.filter(({ weight }) => weight !== 'look');
  const gauge = [...words(details.gauge), ...words(details.finishedSize)];
  if (edition.sizes.length > 0) gauge.push(html`<p>Sizes: ${edition.sizes.join(', ')}</p>`);
  if (details.level) gauge.push(html`<p>Level: <b>${details.level}</b></p>`);
  return html`<div class="watch-about">
    ${part('About it', words(details.introduction), details.introduction === '')}
    ${part(`Changed in edition ${edition.edition ?? ''}`, list(told.map(erratum)), told.length === 0)}
    <div class="watch-facts">
      ${part('Materials', list(materials.map(({ text }) => html`${text}`)), materials.length === 0)}
      ${part('Gauge, size, level', gauge, gauge.length === 0)}
      ${part('Abbreviations used', abbreviations(edition), edition.abbreviations.length === 0)}
      ${part(
        'Special stitches',
        specialStitches.map(
          ({ name, abbreviation, text }) =>
            html`<p><b>${name}${abbreviation !== '' && ` (${abbreviation})`}:</b> ${text[terms]}</p>`,
        ),
        specialStitches.length === 0,
      )}
      ${part(
        'Notes',
        notes.map((note) => html`<p>${note[terms]}</p>`),
        notes.length === 0,
      )}
    </div>
    ${cautionsHtml(edition)} ${part('Care', words(details.care), details.care === '')}
    ${part('What may be done with it', words(details.permission), details.permission === '')}
    ${part('Questions', words(details.contact), details.contact === '')}
  </div>`;
}
