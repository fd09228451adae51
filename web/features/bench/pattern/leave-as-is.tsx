import { useState } from 'react';
import { type LineCount } from '#crochet';
import { type Line } from '#contract/rows';
import { Button } from '../../../ui/button.tsx';
import { KeptField } from '../../../ui/kept-field.tsx';
import { useDesk } from '../desk/use-desk.ts';

const OPEN: ReadonlySet<string> = new Set(['unread', 'does-not-fit', 'differs']);

/** The figure that was meant, where the recording alone says another than the work and the writing do. */
function meantFigure(line: Line, count: LineCount): number | null {
  if (count.verdict !== 'differs' || !line.said || count.count === null) return null;
  const writtenAgrees = count.written === null || !count.odd.includes('written');
  return writtenAgrees && count.odd.includes('said') ? count.count : null;
}

/**
 * The two ways to settle a line that the instruction cannot mend: the total was a slip of the tongue, or the line
 * stays as it is for a reason. Publishing asks for one of them.
 */
export function LeaveAsIs({ line, count }: { line: Line; count: LineCount | undefined }) {
  const { bench, pattern } = useDesk();
  const [isAsking, setAsking] = useState(false);
  const reason = line.putAsideReason;
  if (!pattern.mayEdit || !count || (!OPEN.has(count.verdict) && reason === null)) return null;
  const meant = meantFigure(line, count);
  return (
    <div className="flex flex-wrap items-end gap-x-3.5 gap-y-1.5 py-1.5">
      {meant !== null && (
        <Button size="row" onClick={() => bench.edit('line', line.id, { said: { sts: [meant] } })}>
          {`A slip of the tongue: ${meant} was meant`}
        </Button>
      )}
      {reason === null && !isAsking ? (
        <Button size="row" kind="quiet" onClick={() => setAsking(true)}>
          Leave it as it is, because …
        </Button>
      ) : (
        <div className="min-w-[260px] grow">
          <KeptField
            label="It stays as it is, because"
            hint="The studio sees the reason; the sheet does not print it."
            maxLength={500}
            value={reason ?? ''}
            onSave={(text) => bench.edit('line', line.id, { putAsideReason: text.trim() === '' ? null : text })}
          />
        </div>
      )}
    </div>
  );
}
