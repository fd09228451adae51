import { describe, expect, test } from 'vitest';
import { HOOKS, hookLabel, nameOf, readLine, stitchOf, translate, YARN_WEIGHTS } from '#crochet';
import { Details } from '#contract/pattern-details';

/**
 * Craft Yarn Council, Standards & Guidelines for Knitting and Crochet, February 2018: abbreviations, terms of both
 * sides, yarn weights, levels. Where another source is meant it stands at the figure.
 */
describe('abbreviations and what a stitch uses and makes', () => {
  test.each([
    ['ch', 0, 0],
    ['sc', 1, 1],
    ['hdc', 1, 1],
    ['dc', 1, 1],
    ['tr', 1, 1],
    ['dtr', 1, 1],
    ['trtr', 1, 1],
    ['inc', 1, 2],
    ['dec', 2, 1],
    ['sc2tog', 2, 1],
    ['dc2tog', 2, 1],
    ['tr2tog', 2, 1],
    ['sc3tog', 3, 1],
    ['fpdc', 1, 1],
    ['bpdc', 1, 1],
    ['cluster', 1, 1],
    ['bobble', 1, 1],
    ['popcorn', 1, 1],
    ['puff', 1, 1],
  ])('%s uses %i and makes %i', (key, uses, makes) => {
    expect(stitchOf(key)).toMatchObject({ uses, makes });
  });

  test.each([
    ['sl st', 'slst'],
    ['ext sc', 'esc'],
    ['edc', 'edc'],
    // American Thread Co., Star Book No. 98, 1953: the older spellings.
    ['s c', 'sc'],
    ['s d c', 'hdc'],
    ['d c', 'dc'],
    ['tr c', 'tr'],
  ])('“%s” is read as %s', (typed, key) => {
    expect(readLine(`${typed} in next st`).tree.items).toMatchObject([{ type: 'work', stitch: key }]);
  });

  test.each(['BLO', 'FLO', 'sk', 'tog', 'rnd', 'MR', 'RS', 'WS'])('%s is understood', (typed) => {
    const line = {
      BLO: 'BLO: 6 sc',
      FLO: 'FLO: 6 sc',
      sk: 'sk 1, 6 sc',
      tog: 'sc 2 tog',
      rnd: 'rnd 2: 6 sc',
      MR: '6 sc in MR',
    }[typed];
    expect(readLine(line ?? `${typed}: 6 sc`).unread).toEqual([]);
  });
});

describe('US and UK', () => {
  test.each([
    ['ch', 'ch', 'ch'],
    ['slst', 'sl st', 'ss'],
    ['sc', 'sc', 'dc'],
    ['hdc', 'hdc', 'htr'],
    ['dc', 'dc', 'tr'],
    ['tr', 'tr', 'dtr'],
    ['dtr', 'dtr', 'trtr'],
    ['sc2tog', 'sc2tog', 'dc2tog'],
    ['dc2tog', 'dc2tog', 'tr2tog'],
    ['fpdc', 'FPdc', 'FPtr'],
  ])('%s is %s in the US and %s in the UK', (key, us, uk) => {
    expect([nameOf(key, 'US'), nameOf(key, 'UK')]).toEqual([us, uk]);
  });

  test.each([
    ['sk 1, 3 dc in next ch-1 sp', 'miss 1, 3 tr in next ch-1 sp'],
    ['gauge', 'tension'],
    // A yarn company's beret leaflet of the UK prints yrh; the council's table has yoh.
    ['yo', 'yrh'],
  ])('“%s” is “%s”, there and back', (us, uk) => {
    expect(translate(us, 'US', 'UK')).toBe(uk);
    expect(translate(uk, 'UK', 'US')).toBe(us);
  });

  test('yoh is read beside yrh: common practice', () => {
    for (const typed of ['yoh', 'yrh']) expect(readLine(`${typed}, 6 dc`, { terms: 'UK' }).unread).toEqual([]);
  });
});

describe('hooks: common practice over several makers’ charts; 3.5 and 4.5 mm in use in a UK beret leaflet', () => {
  test.each([
    [2.25, 'US B-1, old UK 13'],
    [2.75, 'US C-2, old UK 11 or 12'],
    [3, 'old UK 11'],
    [3.25, 'US D-3, old UK 10'],
    [3.5, 'US E-4, old UK 9'],
    [4, 'US G-6, old UK 8'],
    [4.5, 'US 7, old UK 7'],
    [5, 'US H-8, old UK 6'],
    [5.5, 'US I-9, old UK 5'],
    [6, 'US J-10, old UK 4'],
    [6.5, 'US K-10½, old UK 3'],
    [7, 'old UK 2'],
    [8, 'US L-11, old UK 0'],
    [10, 'US N/P-15, old UK 000'],
    [4.25, ''],
  ])('%f mm is “%s”', (mm, label) => {
    expect(hookLabel(mm)).toBe(label);
  });

  test('sizes only grow, and no label stands at two of them', () => {
    const sizes = HOOKS.map(({ mm }) => mm);
    expect(sizes).toEqual([...new Set(sizes)].sort((a, b) => a - b));
    const labels = HOOKS.flatMap(({ us }) => us ?? []);
    expect(labels).toEqual([...new Set(labels)]);
  });
});

describe('yarn weights', () => {
  test.each([
    [0, 'lace', 32, 42],
    [1, 'super fine', 21, 32],
    [2, 'fine', 16, 20],
    [3, 'light', 12, 17],
    [4, 'medium', 11, 14],
    [5, 'bulky', 8, 11],
    // Editions differ here: 6 to 9 in one, 7 to 9 in a later one.
    [6, 'super bulky', 7, 9],
  ])('%i is %s, %i to %i stitches over 4 inches', (number, name, fewest, most) => {
    expect(YARN_WEIGHTS[number]).toMatchObject({ number, name, stitches: [fewest, most] });
  });

  test('jumbo has six and fewer, on a hook of 15 mm and larger', () => {
    expect(YARN_WEIGHTS[7]).toMatchObject({ name: 'jumbo', stitches: [1, 6], hookMm: [15, null] });
  });

  test('each begins with the hook at which the one before ends', () => {
    for (const [i, { hookMm }] of YARN_WEIGHTS.entries()) {
      if (i > 0) expect(hookMm[0]).toBe(YARN_WEIGHTS[i - 1]!.hookMm[1]);
    }
  });
});

test('levels are the four of the current set', () => {
  const level = Details.shape.level;
  for (const name of ['basic', 'easy', 'intermediate', 'complex']) expect(level.parse(name)).toBe(name);
  for (const older of ['beginner', 'experienced']) expect(level.safeParse(older).success).toBe(false);
});
