import { describe, expect, test } from 'vitest';
import { buildEdition, projectEdition, type EditionSource } from '#crochet';
import { renderSheet, type SheetOptions } from '../../../api/features/sheet/page/render-sheet.ts';
import { mouseSource, round, step } from '../../support/mouse-source.ts';
import { pdfCodes, pdfFaults, pdfFonts, pdfInfo, pdfLayout, pdfText } from '../../support/read-pdf.ts';

const ADDRESS = 'https://roundelay.example/w/h9m2k7p4/1';

const render = (source: EditionSource = mouseSource(), over: Partial<SheetOptions> = {}) =>
  renderSheet(projectEdition(buildEdition(source)), {
    paper: 'A4',
    terms: 'US',
    address: ADDRESS,
    made: new Date('2026-03-21T10:00:00Z'),
    ...over,
  });

describe('a printed sheet', () => {
  test('is a tagged PDF with a title, a language and its own fonts, and nothing wrong with it', async () => {
    const pdf = await render();
    expect(pdfInfo(pdf)).toMatchObject({
      Title: 'Harvest mouse, edition 1',
      Author: 'Ismay T.',
      Tagged: 'yes',
      'PDF version': '1.7',
      Pages: '1',
      'Page size': expect.stringContaining('A4'),
    });
    expect(pdf.toString('latin1')).toContain('/Lang (en)');
    expect(pdfFaults(pdf)).toBe('');
    const fonts = pdfFonts(pdf);
    expect(fonts.length).toBeGreaterThanOrEqual(4);
    for (const font of fonts) expect(font).toMatch(/(Lora|AlegreyaSans).* yes yes yes /);
  });

  test('reads in the order of the work: what is needed, cautions, then piece by piece', async () => {
    const text = pdfText(await render()).replace(/\s+/g, ' ');
    const order = [
      'Harvest mouse',
      'By Ismay T., Ninepin Loft. Proofread by Corin H.',
      'Edition 1, 21 March 2026.',
      'Materials',
      'DK cotton, wheat: weight 3, light',
      'Gauge, size, level',
      'Abbreviations used',
      'single crochet',
      'Key and notes',
      'Cautions',
      'Small parts.',
      'not a safety certificate',
      'Body',
      '6 sc in magic ring',
      'Set the two eyes between R5 and R6.',
      'Ear',
      'Tail',
    ];
    const places = order.map((words) => text.indexOf(words));
    expect(places).not.toContain(-1);
    expect([...places].sort((a, b) => a - b)).toEqual(places);
  });

  test('has each line with its label, instruction, total and moment side by side', async () => {
    const rows = pdfLayout(await render());
    expect(rows).toMatch(/R1 +6 sc in magic ring +6 +02:14/);
    expect(rows).toMatch(/R4–6 +sc around +18 each +07:31/);
    expect(rows).toMatch(/R7 +\(sc, inv dec\) × 6 +12 +12:46/);
    expect(rows).toMatch(/Row 1 +ch 25, sc in 2nd ch from hook and in each ch across +24 +27:40/);
  });

  test('prints in UK terms where asked', async () => {
    const rows = pdfLayout(await render(mouseSource(), { terms: 'UK' }));
    expect(rows).toMatch(/R1 +6 dc in magic ring/);
    expect(rows).toMatch(/dc +double crochet/);
    expect(rows).not.toMatch(/single crochet/);
  });

  test('fits Letter paper', async () => {
    expect(pdfInfo(await render(mouseSource(), { paper: 'Letter' }))['Page size']).toContain('612 x 792 pts');
  });

  test('carries a code that a decoder reads as the address of its page', async () => {
    expect(pdfCodes(await render())).toEqual([ADDRESS]);
  });

  test('says that a draft is one, and gives it no code and no address', async () => {
    const pdf = await render(mouseSource({ edition: null, publishedAt: null }));
    const text = pdfText(pdf);
    expect(text).toContain('Draft: not published');
    expect(text).toContain('Harvest mouse, draft');
    expect(text).not.toContain('roundelay.example');
    expect(pdfCodes(pdf)).toEqual([]);
    expect(pdfInfo(pdf).Title).toBe('Harvest mouse (draft)');
  });

  test('draws what no font has or puts it in plain letters, and never prints a box for it', async () => {
    const notes = ['Łucja’s řetízek → ≈ 2 ½ ⅓ № 5 ﬁne', 'Мышь'];
    const text = pdfText(await render(mouseSource({ notes })));
    expect(text).toContain('Łucja’s řetízek');
    expect(text).toContain('1/3 № 5 fine');
    expect(text).toContain('Мышь');
    expect(text).not.toContain('\uFFFD');
  });

  test('tells what changed since the edition before, and leaves out what is of the look alone', async () => {
    const errata = [
      {
        shortId: 'mr7',
        place: 'Body, R7',
        weight: 'correction' as const,
        was: 'dec × 6 (6)',
        now: '(sc, inv dec) × 6 (12)',
        why: 'A slip.',
      },
      { shortId: null, place: 'Title', weight: 'look' as const, was: 'Field mouse', now: 'Harvest mouse', why: '' },
    ];
    const text = pdfText(await render(mouseSource({ edition: 2, errata }))).replace(/\s+/g, ' ');
    expect(text).toContain('Changed in edition 2 Body, R7: “dec × 6 (6)” now reads “(sc, inv dec) × 6 (12)”. A slip.');
    expect(text).not.toContain('Field mouse');
  });

  test('is the same to the byte for the same edition, but for the id of the file', async () => {
    const plain = (pdf: Buffer) => pdf.toString('latin1').replace(/\/ID \[[^\]]*\]/, '');
    expect(plain(await render())).toBe(plain(await render()));
  });
});

describe('a long pattern', () => {
  const long = (() => {
    const source = mouseSource();
    const lines = Array.from({ length: 300 }, (_, i) => {
      const n = i + 1;
      if (n % 25 === 0) return step(`Step after round ${n}: stuff, and look at it from the side.`, `s${n}`);
      return n === 1
        ? round('R1', '24 sc in magic ring (24)', n, { shortId: 'l1' })
        : round(`R${n}`, n % 7 === 0 ? '(2 sc, inc, 2 sc, dec) × 4 (24)' : 'sc around (24)', n, { shortId: `l${n}` });
    });
    return { ...source, pieces: [{ ...source.pieces[0]!, lines }, ...source.pieces.slice(1)] };
  })();

  test('runs over pages whole: every line once, the head repeated, every page numbered', async () => {
    const pdf = await render(long);
    const pages = pdfLayout(pdf)
      .split('\f')
      .filter((page) => page.trim() !== '');
    expect(pages.length).toBeGreaterThan(7);
    const labels = pages.flatMap((page) => [...page.matchAll(/^ *R(\d+) {2,}/gm)].map((match) => Number(match[1])));
    const wanted = [...Array.from({ length: 300 }, (_, i) => i + 1).filter((n) => n % 25 !== 0), 1, 2];
    expect(labels).toEqual(wanted);
    pages.forEach((page, i) => {
      expect(page).toContain(`${i + 1} of ${pages.length}`);
      const [first] = page.trim().split('\n');
      if (i > 0) expect(first).toMatch(/continued|^(Ear|Tail|Care)/);
    });
  });

  test('never leaves the heading of a piece alone at the foot of a page', async () => {
    const pages = pdfLayout(await render(long)).split('\f');
    for (const page of pages) {
      const rows = page.split('\n').filter((row) => row.trim() !== '');
      const at = rows.findIndex((row) => /^(Body|Ear|Tail)\b.*make \d/.test(row));
      if (at >= 0)
        expect(rows.slice(at + 1, at + 3).filter((row) => /^ *(R\d|Row)/.test(row)).length).toBeGreaterThan(0);
    }
  });
});
