import { roundOf, type Shot, type Story } from './story.ts';
import type { View } from './scenes.ts';

const shot = (view: View, say: string, pause?: number): Shot => ({ view, say, ...(pause !== undefined && { pause }) });

/** The film of the kettle holder: two hexagons held together by their edge. */
export const KETTLE_HOLDER: Story = {
  name: 'kettle-holder',
  shots: [
    shot(
      { show: 'title', title: 'Kettle holder', about: 'Ismay T., Ninepin Loft', piece: 'holder' },
      'This is the kettle holder, from Ninepin Loft.',
    ),
    shot(
      { show: 'materials', yarn: 'slate' },
      'Use cotton or wool, never acrylic, because it will be hot. Worsted weight, and a four millimetre hook.',
    ),
    shot({ show: 'holder' }, 'It is two hexagons, laid together for thickness. American terms.', 1),
    shot(
      { show: 'ring', yarn: 'slate', from: 0, to: 0 },
      'First the hexagon. Make two of these. Each round is joined with a slip stitch, then chain one.',
    ),
    shot(
      { show: 'ring', yarn: 'slate', from: 0, to: 1 },
      'Round one. Six single crochet in a magic ring. Six stitches.',
      2,
    ),
    ...roundOf('hexagon', 2, ['Round two. Increase in every stitch around. Twelve stitches.'], 2),
    ...roundOf('hexagon', 3, ['Round three. One single crochet, then an increase, six times. Eighteen stitches.'], 2),
    ...roundOf('hexagon', 4, ['Round four. Two single crochet, then an increase, six times. Twenty-four stitches.'], 2),
    ...roundOf('hexagon', 5, ['Round five. Three single crochet, then an increase, six times. Thirty stitches.'], 2),
    ...roundOf('hexagon', 6, ['Round six. Four single crochet, then an increase, six times. Thirty-six stitches.'], 2),
    ...roundOf('hexagon', 7, ['Round seven. Five single crochet, then an increase, six times. Forty-two stitches.'], 2),
    ...roundOf(
      'hexagon',
      8,
      ['Round eight. Six single crochet, then an increase, six times. Forty-eight stitches.'],
      2,
    ),
    ...roundOf(
      'hexagon',
      9,
      ['Round nine. Seven single crochet, then an increase, six times. Fifty-four stitches.'],
      2,
    ),
    ...roundOf('hexagon', 10, ['Round ten. Eight single crochet, then an increase, six times. Sixty stitches.'], 2),
    shot(
      { show: 'edge', from: 0, to: 0 },
      'Fasten off the first and weave in its ends. Leave the second one on the hook.',
      1,
    ),
    shot({ show: 'edge', from: 0, to: 0.2 }, 'Now the edge. Lay the two together, wrong sides inside.'),
    shot(
      { show: 'edge', from: 0.2, to: 1 },
      'Round one. One single crochet in each stitch around, through both of them. Sixty stitches.',
      3,
    ),
    shot(
      { show: 'edge', from: 1, to: 1 },
      'Chain twelve, and slip stitch where you began, for the loop to hang it by.',
      1,
    ),
    shot({ show: 'holder' }, 'Fasten off, weave in the end, and press it flat.', 1.4),
  ],
};
