import { type CautionKind, usualCaution } from './cautions.ts';
import { type Check, finding } from './check.ts';
import { type Scan } from './scan.ts';
import { type CheckUse } from './source.ts';

/** What a title, a piece's name or the introduction says that the piece is for. */
const USES: readonly (readonly [use: CheckUse, words: RegExp, forWhat: string])[] = [
  [
    'hot',
    /\b(?:(?:pot|pan|kettle)[- ]?holders?|oven[- ]?(?:gloves?|mitts?)|trivets?|hot[- ]?pads?|(?:tea|coffee|egg|mug|pot)[- ]?cos(?:y|ies))\b/i,
    'to be hot',
  ],
  ['carried', /\b(?:bags?|totes?|purses?|backpacks?|handles?|straps?)\b/i, 'to be carried'],
  [
    'sleep',
    /\b(?:baby|cot|crib|pram)(?:['’]s)? (?:\w+ )?(?:blankets?|hats?|bonnets?|caps?|cocoons?)|\b(?:bonnets?|comforters?|sleep(?:ing)? (?:sacks?|hats?|caps?))\b/i,
    'to sleep near',
  ],
  ['chewed', /\b(?:teethers?|teething|rattles?|soothers?|dummy clips?)\b/i, 'to be chewed'],
  [
    'pet',
    /\b(?:cat|dog|kitten|puppy|pet)['’]?s? (?:\w+ )?(?:toys?|beds?|coats?|mats?|collars?|leads?)\b/i,
    'for a pet',
  ],
];

/** A use that the pattern's own words name and its details do not, so that its caution is not printed. */
export function checkUses({ source }: Scan): Check[] {
  const words = [source.title, ...source.pieces.map(({ name }) => name), source.details.introduction].join('\n');
  return USES.flatMap(([use, pattern, forWhat]): Check[] => {
    const said = pattern.exec(words)?.[0];
    if (said === undefined || source.details.uses.includes(use)) return [];
    return [
      finding('caution-use', `“${said}” is made ${forWhat}, and its usual caution is not on the sheet.`, {
        subject: use,
        place: 'sheet',
        mend: {
          words: 'Add the caution',
          done: `Set as made ${forWhat}; its caution stands on the sheet`,
          changes: [{ op: 'edit-pattern', fields: { details: { uses: [...source.details.uses, use] } } }],
        },
      }),
    ];
  });
}

/** What a caution of each kind cannot leave unsaid, however it is put. */
const HAZARD: Readonly<Record<CautionKind, RegExp>> = {
  'small-parts': /\b(?:chok|child|baby|babies|three|3)/i,
  flame: /\b(?:flame|fire|burn|glue|hot|melt|adult)/i,
  wire: /\b(?:wire|ends?)\b/i,
  cords: /\b(?:short|cords?|ties?|loops?|ribbons?|strangl)/i,
  heat: /\b(?:heat|hot|melt|acrylic|cotton|wool)/i,
  sleep: /\b(?:sleep|cot|crib|bed)/i,
  handles: /\b(?:handles?|weight|carr|load)/i,
  pets: /\b(?:pet|cat|dog|chew|swallow)/i,
  teething: /\b(?:chew|teeth|mouth|loose)/i,
};

/** A caution that something brings, put in words that no longer name its hazard. */
export function checkReworded({ source }: Scan): Check[] {
  return source.cautions.flatMap(({ id, kind, text }): Check[] => {
    const hazard = (HAZARD as Readonly<Record<string, RegExp>>)[kind];
    if (id === null || !hazard || hazard.test(text)) return [];
    return [
      finding(
        'caution-reworded',
        `The caution “${text.length > 60 ? `${text.slice(0, 59)}…` : text}” no longer names what it warns of.`,
        {
          subject: kind,
          place: 'sheet',
          mend: {
            words: 'Use the usual words',
            done: 'The caution stands in the usual words',
            changes: [{ op: 'edit', row: 'caution', id, fields: { text: usualCaution(kind as CautionKind) } }],
          },
        },
      ),
    ];
  });
}
