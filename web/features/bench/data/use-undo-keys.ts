import { useKeys } from '../../../lib/use-keys.ts';
import type { Bench, UndoOutcome } from './bench-types.ts';

/**
 * Ctrl+Z takes back one's own last step, Ctrl+Y or Ctrl+Shift+Z brings it again. In a field the keys are the field's.
 * @param tell what came of it; a refusal has its reason in words
 */
export function useUndoKeys(
  bench: Pick<Bench, 'undo' | 'redo'>,
  tell: (outcome: UndoOutcome, which: 'undo' | 'redo') => void,
): void {
  const redo = () => void bench.redo().then((outcome) => tell(outcome, 'redo'));
  useKeys({
    'Ctrl+Z': () => void bench.undo().then((outcome) => tell(outcome, 'undo')),
    'Ctrl+Y': redo,
    'Ctrl+Shift+Z': redo,
  });
}
