import { SHADES } from './no-names.ts';

/** Words with commas between, as one alternative of a pattern. */
const any = (list: string): string =>
  `(?:${list
    .trim()
    .split(/\s*,\s*/)
    .join('|')})`;

const THE = any('the, a, an, your, my, our, his, her, its, some, that, this, these, those, another, one, both');
const IT = any('it, him, her, them, this, that, these, those, everything, the whole thing');
const COLOUR = any(
  `${[...SHADES].slice(0, [...SHADES].indexOf('first')).join(', ')}, second color, other color, next color, new color,
  main color, color, colour, shade, new yarn, second one, other one`,
);
const FILLING = any(
  'stuffing, filling, fluff, fill, polyfill, fibrefill, fiberfill, batting, wadding, toy filling, fleece, beans, pellets, pebbles, rice',
);
const MARKER = any(
  'marker, markers, stitch marker, bobby pin, paper clip, safety pin, hair grip, peg, tag, piece of yarn, loop of thread, scrap',
);
const FEATURE = any(
  `nose, smile, mouth, face, whiskers, eyebrows, brows, eyelashes, lashes, freckles, cheeks, nostrils, claws, spots,
  stripes, spines, thumbprint, details`,
);
const TRIM = any('ribbon, cord, string, drawstring, elastic, lace, wire');
const HANGING = any('fringe, tassel, tassels, pompom, pom-pom, bobble on, loop on, bow');
const PUT = any('put, push, pop, place, poke, shove, fit, snap, press, insert, add, work, tuck, jam, cram, ease');
const SEW = any('sew, stitch, whip, whipstitch, attach, fix, fasten, tack, glue');

/** The topics of steps, each by the doings that it is told with; the first that matches at a word names the step. */
const DOINGS: readonly (readonly [topic: string, doings: readonly string[]])[] = [
  [
    'marker',
    [
      String.raw`(?:put|pop|place|hang|stick|clip|slip|use|add|move|set)\b.{0,18}\b${MARKER}`,
      String.raw`${MARKER} (?:in\b|here|please)`,
      String.raw`hang (?:my|your|the|a) loop`,
      String.raw`put something in there`,
    ],
  ],
  [
    'eyes',
    [
      String.raw`${PUT}\b.{0,22}\beyes?\b`,
      String.raw`(?:safety )?eyes? (?:go|goes|in\b|are going|now)`,
      String.raw`(?:so|now) the eyes\b`,
      String.raw`the eyes (?:go|are going|now|next)\b`,
    ],
  ],
  [
    'stuff',
    [
      String.raw`stuff(?:ing)? (?:${IT}|the|what|in|his|their|firmly|lightly|now|as)\b`,
      String.raw`stuff\b(?=.{0,12}(?:now|firm))`,
      String.raw`(?:now )?(?:you )?(?:fill|pack|plump) (?:${IT}|the|his|in|up)\b`,
      String.raw`(?:${PUT}) .{0,28}\b${FILLING}\b`,
      String.raw`(?:jam|cram|shove|push) .{0,22}\b(?:inside|in)\b`,
      String.raw`(?:a )?(?:little|tiny|bit|wisp|pinch|some|handful) (?:bit )?(?:of )?(?:${FILLING})\b`,
      String.raw`(?:they|it|he|she|the \w+) (?:gets?|takes?|wants?) (?:a )?(?:little|some|tiny)?.{0,8}${FILLING}`,
      String.raw`${FILLING} (?:in\b|into|goes|${FILLING})`,
    ],
  ],
  [
    'embroider',
    [
      String.raw`embroider\b`,
      String.raw`(?:put|sew|stitch|draw|add|make|do|give)\b.{0,20}\b${FEATURE}\b`,
      String.raw`sew on (?:the |2 )?(?:little |tiny )?eyes`,
      String.raw`(?:last|next|now|then) (?:the )?${FEATURE}\b`,
      String.raw`with (?:a )?(?:bit of|strand of|contrasting|black|dark) .{0,20}\b(?:${FEATURE}|embroider)`,
    ],
  ],
  [
    'colour',
    [
      String.raw`(?:change|switch(?:ing)?|swap|go|going|move) (?:back )?(?:over )?(?:to|into|from) (?:${THE} )?(?:\w+ )?${COLOUR}\b`,
      String.raw`back to (?:${THE} )?(?:\w+ )?${COLOUR}\b(?! and you will have)`,
      String.raw`(?:quick |now )?change\b.{0,10}\b(?:color|colour|yarn)`,
      String.raw`(?:color|colour|line) change\b`,
      String.raw`(?:join|bring in|tie in|tie on|pick up|hook in|take|introduce|drop|lose|break off|cut|snip|put in|putting in|add in|attach) ${THE} (?:\w+ )?${COLOUR}\b`,
      String.raw`(?:say goodbye to|bring in|introduce|join|switch to|change to) (?:${THE} )?${COLOUR}\b`,
      String.raw`tie (?:${THE} )?${COLOUR} (?:on|in)\b`,
      String.raw`next (?:color|colour)\b`,
      String.raw`(?:${THE} )?${COLOUR} (?:joins|comes in|comes out|is cut|is joined|goes in|away|has to be|for the)\b`,
      String.raw`(?:i|we|you) (?:am|are) (?:going to )?(?:switch|switching|chang\w+|swapping)\b`,
    ],
  ],
  [
    'block',
    [
      String.raw`(?:(?:want to|wanna|going to|you can) )?(?:wet )?block\b`,
      String.raw`(?:wet|steam|soak|mist|spray) ${IT}\b`,
      String.raw`pin (?:${IT}|the)\b.{0,20}(?:out|flat|edges|size)`,
      String.raw`press ${IT} (?:flat|under|lightly)`,
    ],
  ],
  [
    'sew',
    [
      String.raw`(?:we |you )?sew(?:ing)?\b`,
      String.raw`(?:whip|attach|assembl\w*)\b`,
      String.raw`stitch (?:${IT}|the|one|both) .{0,24}\b(?:on|together|down|to|closed|shut)\b`,
      String.raw`stitch (?:it|him|her|them) (?!after|later)`,
      String.raw`(?:put|make) (?:${IT}) (?:together|up)\b`,
      String.raw`(?:roll|pin|wrap) (?:${IT}|the|one) (?:up|around|round|over|in half|edges?)\b`,
      String.raw`fold (?:it|that|the)\b`,
      String.raw`(?:the )?\w+ (?:goes|go|is sewn|are sewn) on\b`,
      String.raw`(?:the )?\w+ on (?:first|next|last)\b`,
      String.raw`(?:set|tie|hang) the \w+ (?:in|inside|on|onto|side by side|between)\b`,
      String.raw`${SEW} (?:${THE} )?\w+ (?:on|onto|to|together|down)\b`,
    ],
  ],
  [
    'join',
    [
      String.raw`(?:to )?join (?:the|in|your|a|them|two|2|these|with|on)\b`,
      String.raw`bring the (?:\w+ )?ends? (?:together|round|around|up)`,
      String.raw`(?:put|stick|insert) your (?:wool|yarn|hook|thread) (?:in|back in|through)`,
      String.raw`(?:lay|hold) (?:${IT}|the \w+) (?:together|against|flat (?:with|on))\b`,
      String.raw`fold ${IT} and (?:knot|join|tie)`,
      String.raw`hook (?:${THE} )?(?:yarn|wool|thread|${COLOUR}) on`,
    ],
  ],
  [
    'finish',
    [
      String.raw`fasten (?:(?:${IT}) )?off|fasten the`,
      String.raw`finish (?:${IT} )?off`,
      String.raw`cut (?:${IT}|${THE}|off)\b|cut (?=and|tuck)|(?:okay now|then) cut\b`,
      String.raw`break (?:off )?(?:the|your|${IT}|off)\b`,
      String.raw`snip\b`,
      String.raw`(?:tie|bind) (?:${IT} )?off`,
      String.raw`close (?:${IT}|up)\b|you know how to close`,
      String.raw`cinch\b`,
      String.raw`draw (?:${IT}|the|up)\b.{0,12}(?:up|tight|in|through)`,
      String.raw`pull (?:${IT}|up|the) .{0,16}(?:closed|shut|hole)`,
      String.raw`(?:weave|darn|run|sew|work) in (?:your|the|all|both|those|any)? ?(?:loose )?(?:ends?|tails?)`,
      String.raw`weave (?:in|it|the)\b|darn\b`,
      String.raw`hide (?:${IT}|the|your|both)\b|bury\b|tuck\b`,
      String.raw`leave (?:yourself |me |a |enough |the |plenty )(?:a |of )?.{0,14}(?:tail|sew|end)`,
      String.raw`(?:a )?(?:long )?tail (?:cut|left)|long tail|knot the end|run ${IT} through|off with the`,
    ],
  ],
  [
    'surface',
    [
      String.raw`surface (?:slip stitch|crochet|chain|work)`,
      String.raw`(?:run|work|make) (?:a )?(?:line of |row of )?slip stitch(?:es)? (?:up|over|across|along|on top)`,
      String.raw`take (?:${THE} )?(?:contrast(?:ing)? )?(?:yarn|${COLOUR}) and run`,
    ],
  ],
  [
    'finish',
    [
      String.raw`(?:run|thread|lace|weave) (?:${THE} )?(?:narrow |long )?${TRIM}`,
      String.raw`(?:the )?${TRIM} (?:is|gets) (?:threaded|laced|run|drawn)\b`,
      String.raw`(?:put|add|did|do|make|tie|hang) (?:${THE} )?${HANGING}\b`,
      String.raw`(?:last thing is|lastly) (?:the|a)\b`,
    ],
  ],
];

/** What is done between rounds, by how it is said. The first that matches at a word names the step. */
export const STEPS: readonly { readonly topic: string; readonly words: RegExp }[] = DOINGS.map(([topic, doings]) => ({
  topic,
  words: new RegExp(`^(?:${doings.join('|')})`),
}));
