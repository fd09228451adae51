import type { Change } from '#contract/changes';
import type { Line, LineEdit } from '#contract/rows';

/** One step in the life of a line: what was done to it, by whom and when, and how it stood afterwards. */
export interface LineStep {
  readonly id: number;
  readonly at: string;
  /** Null: a reading of the recording. */
  readonly who: string | null;
  readonly did: string;
  /** What a line can be made again from this step; order and piece stay as they are. */
  readonly stood: LineEdit;
}

const KEPT = ['kind', 'label', 'from', 'to', 'text', 'note', 'written', 'said'] as const;

const DID: readonly (readonly [fields: readonly string[], words: string])[] = [
  [['text'], 'wrote the instruction'],
  [['written'], 'wrote the total'],
  [['said'], 'put the total said right'],
  [['label', 'from', 'to', 'kind'], 'renamed it'],
  [['note'], 'wrote the note'],
  [['pieceId', 'orderKey'], 'moved it'],
  [['filmed'], 'said whether it is filmed'],
  [['putAsideReason', 'spokenSlip'], 'said why it stays as it is'],
];

function didWords({ before, after, undoesDeedId, person }: Change): string {
  if (before === null) return person === null ? 'was drafted' : 'made the line';
  const fields = Object.keys(after ?? {});
  if (fields.includes('deletedAt')) return after?.deletedAt ? 'took it away' : 'put it back';
  const done = DID.filter(([of]) => of.some((field) => fields.includes(field))).map(([, words]) => words);
  return `${done.join(', ') || 'changed it'}${undoesDeedId === null ? '' : ' (undone)'}`;
}

/**
 * The steps of a line, newest first, as the change log tells them.
 * @param changes of one line, each with the row as it left it
 */
export function lineSteps(changes: readonly Change[]): LineStep[] {
  return changes.map((change) => ({
    id: change.id,
    at: change.at,
    who: change.person?.name ?? null,
    did: didWords(change),
    stood: Object.fromEntries(
      KEPT.flatMap((field) => (change.row?.[field] === undefined ? [] : [[field, change.row[field]]])),
    ),
  }));
}

/** Whether the line stands as this step left it. */
export const standsSo = (line: Line, { stood }: LineStep): boolean =>
  Object.entries(stood).every(([field, value]) => JSON.stringify(line[field as keyof Line]) === JSON.stringify(value));
