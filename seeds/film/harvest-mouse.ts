import { roundOf, type Shot, type Story } from './story.ts';
import type { View } from './scenes.ts';

const shot = (view: View, say: string, pause?: number): Shot => ({ view, say, ...(pause !== undefined && { pause }) });

/** The film of the harvest mouse. Two slips of the tongue and one vague line are meant: they are what the bench is for. */
export const HARVEST_MOUSE: Story = {
  name: 'harvest-mouse',
  shots: [
    shot(
      { show: 'title', title: 'Harvest mouse', about: 'Ismay T., Ninepin Loft', piece: 'mouse' },
      'Hello, I’m Ismay, and this is Ninepin Loft.',
    ),
    shot({ show: 'mouse' }, 'Today we make the harvest mouse, seven centimetres from rump to nose.'),
    shot(
      { show: 'materials', yarn: 'wheat' },
      'You want a light cotton in wheat, and a two and a half millimetre hook.',
    ),
    shot(
      { show: 'materials', yarn: 'wheat' },
      'Two safety eyes, six millimetres, some toy filling, and a stitch marker.',
    ),
    shot({ show: 'mouse' }, 'If it is for a small child, leave the eyes out and embroider the face.'),
    shot({ show: 'mouse' }, 'I use American terms, and we work in a spiral, so nothing is joined.', 1.2),
    shot({ show: 'ring', yarn: 'wheat', from: 0, to: 0 }, 'We start with the body.'),
    shot({ show: 'ring', yarn: 'wheat', from: 0, to: 1 }, 'Round one. Six single crochet in a magic ring.', 3.4),
    shot({ show: 'ring', yarn: 'wheat', from: 1, to: 1 }, 'Pull the ring shut. That’s six.', 1.4),
    ...roundOf('body', 2, [
      'Round two. Increase in every stitch around, so six times.',
      'That gives us twelve stitches.',
    ]),
    ...roundOf('body', 3, ['Round three. One single crochet, then an increase, six times.', 'That makes eighteen.']),
    ...roundOf('body', 4, [
      'Round four. Two single crochet, then an increase, six times.',
      'And that is twenty-four stitches.',
    ]),
    ...roundOf('body', 5, ['Rounds five to eight. One single crochet in each stitch around.'], 2),
    ...roundOf('body', 6, ['It cups by itself now. Just go round.'], 2),
    ...roundOf('body', 7, ['Keep the right side out, where you can see it.'], 2),
    ...roundOf(
      'body',
      8,
      ['So that’s four rounds of plain single crochet, twenty-four stitches in every one of them.'],
      2,
    ),
    ...roundOf(
      'body',
      9,
      [
        'Round nine. This is where we bring it in. Two single, then a decrease,',
        'under the front loops, so it doesn’t leave a hole.',
        'Two single, decrease, and so on, tapering as you like.',
        'You should have eighteen.',
      ],
      2,
    ),
    ...roundOf('body', 10, ['Round ten. One single crochet in each stitch. Eighteen stitches again.']),
    ...roundOf('body', 11, [
      'Round eleven opens her out. Two single crochet, then an increase, six times.',
      'That’s twenty-two stitches.',
    ]),
    ...roundOf('body', 12, ['Rounds twelve and thirteen. One single crochet in each stitch around.'], 2),
    ...roundOf('body', 13, ['Twenty-four stitches in each of those.'], 2),
    ...roundOf('body', 14, [
      'Round fourteen. Three single crochet, then a decrease, six times.',
      'That’s eighteen stitches.',
    ]),
    ...roundOf('body', 15, ['Round fifteen. One single crochet in each stitch, eighteen stitches.']),
    shot(
      { show: 'eyes' },
      'Now put the eyes in, between rounds fourteen and fifteen, with five stitches between them.',
      1.6,
    ),
    shot({ show: 'stuff' }, 'Stop here and make the tail. I show you that at the end.'),
    shot({ show: 'stuff' }, 'Knot the ends of the tail inside, at round one.', 1),
    shot({ show: 'stuff' }, 'Then stuff the body, firmly, while you still can.', 1.6),
    ...roundOf('body', 16, ['Round sixteen. One single crochet, then a decrease, six times. Twelve stitches.']),
    ...roundOf('body', 17, ['Round seventeen. One single crochet in each stitch around.']),
    shot({ show: 'round', piece: 'body', round: 18, from: 0, to: 0 }, 'Top up the filling.', 1),
    ...roundOf('body', 18, ['Round eighteen. Decrease six times. Six stitches left.']),
    shot({ show: 'closing' }, 'Fasten off and leave an end of twenty centimetres.'),
    shot({ show: 'closing' }, 'Gather the last six through their front loops, pull it shut, and bury the end.', 2),
    shot({ show: 'round', piece: 'ear', round: 1, from: 0, to: 0 }, 'Now for the ears. Make two of these.'),
    ...roundOf('ear', 1, ['Round one. Six single crochet in a magic ring. Six stitches.']),
    ...roundOf('ear', 2, ['Round two. Increase in every stitch around. Twelve stitches.']),
    ...roundOf('ear', 3, ['Round three. One single crochet in each stitch around. Twelve stitches.']),
    shot(
      { show: 'sewing' },
      'Fasten off, leave an end of twenty-five centimetres, and sew each ear on over rounds twelve and thirteen.',
      1.6,
    ),
    shot({ show: 'tail', from: 0, to: 0.1 }, 'Last of all, the tail. Make one, worked in a row.'),
    shot(
      { show: 'tail', from: 0.1, to: 0.5 },
      'Row one. Chain twenty-five, slip stitch in the second chain from the hook',
      0.2,
    ),
    shot({ show: 'tail', from: 0.5, to: 1 }, 'and in each chain across. That’s twenty-four.', 1.6),
    shot({ show: 'tail', from: 1, to: 1 }, 'Leave both ends long, they are what you knot inside the body.'),
    shot({ show: 'mouse' }, 'And there is your harvest mouse. Sew everything down twice.', 1.4),
  ],
};
