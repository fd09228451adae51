import { type Check, type CheckChange, type Mend } from '#crochet';
import { type LeftCheck } from '#contract/checks';
import { type Bench, type RowTypes } from '../data/bench-types.ts';
import { type Desk } from '../desk/use-desk.ts';

function make(bench: Bench, change: CheckChange): void {
  if (change.op === 'edit-pattern') bench.editPattern(change.fields);
  else if (change.op === 'remove') bench.remove(change.row, change.id);
  else if (change.op === 'edit') bench.edit(change.row, change.id, change.fields);
  else bench.add(change.row, change.fields as unknown as RowTypes[typeof change.row]['create']);
}

/** Mends a check in all its lines: one deed, and one undo takes it back. */
export function mendCheck(desk: Desk, mend: Mend): void {
  desk.bench.asOneDeed(() => {
    for (const change of mend.changes) make(desk.bench, change);
  });
  desk.tellDone(mend.done);
}

/** Leaves a check as it is, with the reason; it comes back when it says something else. */
export function leaveCheck(desk: Desk, { kind, subject, says }: Check, reason: string): void {
  const known = desk.pattern.leftChecks.find((one) => one.kind === kind && one.subject === subject);
  if (known) desk.bench.edit('left-check', known.id, { says, reason });
  else desk.bench.add('left-check', { kind, subject, says, reason });
  desk.tellDone('Left as it is');
}

/** Opens a check again that was left. */
export function reopenCheck(desk: Desk, left: LeftCheck): void {
  desk.bench.remove('left-check', left.id);
  desk.tellDone('Open again');
}
