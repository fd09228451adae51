import { describe, expect, test } from 'vitest';
import { readLine, STITCHES, translate } from '#crochet';

/** The stitch that a name alone is read as. */
function keyOf(name: string, terms: 'US' | 'UK'): string | undefined {
  const [item] = readLine(`3 ${name}`, { terms }).tree.items;
  return item?.type === 'work' ? item.stitch : undefined;
}

describe.each(STITCHES.map((row) => [row.us[1], row] as const))('%s', (_, row) => {
  test('is read by its abbreviation and its name in both terms', () => {
    expect([...row.us, ...row.uk].map((name, i) => keyOf(name, i < 2 ? 'US' : 'UK'))).toEqual(Array(4).fill(row.key));
  });

  test('goes from US to UK and back as it was', () => {
    for (const name of row.us)
      expect(translate(translate(`3 ${name} in next st`, 'US', 'UK'), 'UK', 'US')).toBe(`3 ${name} in next st`);
  });
});
