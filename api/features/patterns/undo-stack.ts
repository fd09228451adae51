import type { DeedRow } from './changes.store.ts';

/**
 * What undo and redo would take back next, from a person's deeds in the order they were done. Undoing and redoing are
 * deeds themselves: redo is the undoing of an undo. Something new done after an undo leaves nothing to redo.
 */
export function undoStack(deeds: readonly DeedRow[]): { undo: string | null; redo: string | null } {
  const undo: string[] = [];
  let redo: string[] = [];
  for (const { deedId, undoesDeedId } of deeds) {
    if (undoesDeedId === null) {
      undo.push(deedId);
      redo = [];
    } else if (undo.at(-1) === undoesDeedId) {
      undo.pop();
      redo.push(deedId);
    } else if (redo.at(-1) === undoesDeedId) {
      redo.pop();
      undo.push(deedId);
    }
  }
  return { undo: undo.at(-1) ?? null, redo: redo.at(-1) ?? null };
}
