import type { LineDifference, ReadingDifferences } from '#contract/readings';

/** Keys of the differences that are taken. */
export type Chosen = ReadonlySet<string>;

/** Every difference, piece by piece, and then what is no longer found. */
export const allDifferences = ({ pieces, gone }: ReadingDifferences): readonly LineDifference[] => [
  ...pieces.flatMap(({ lines }) => lines),
  ...gone,
];

/** What is offered to be taken: what is new or heard otherwise, and never what a person wrote or took away. */
const isOffered = ({ change, touched }: LineDifference) => !touched && (change === 'new' || change === 'changed');

export const offered = (told: ReadingDifferences): Chosen =>
  new Set(
    allDifferences(told)
      .filter(isOffered)
      .map(({ key }) => key),
  );

/** Why a difference is not taken unless somebody asks for it. */
export function whyKept({ change, touched }: LineDifference): string | null {
  if (change === 'gone') return 'no longer heard';
  if (change === 'taken-away') return 'somebody deleted it';
  return touched ? 'written by hand' : null;
}

/** "3 lines heard otherwise, 1 new, 1 no longer heard". */
export function differenceWords(told: ReadingDifferences): string {
  const all = allDifferences(told);
  const count = (change: LineDifference['change']) => all.filter((one) => one.change === change).length;
  const lines = (n: number) => (n === 1 ? '1 line' : `${n} lines`);
  const parts = [
    count('changed') > 0 ? `${lines(count('changed'))} heard otherwise` : '',
    count('new') > 0 ? `${count('new')} new` : '',
    count('gone') > 0 ? `${count('gone')} no longer heard` : '',
    count('taken-away') > 0 ? `${count('taken-away')} heard that you took away` : '',
  ].filter((part) => part !== '');
  return parts.length === 0 ? 'Every line stands as it was heard' : parts.join(', ');
}
