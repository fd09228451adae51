import { useId } from 'react';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { PatternHead } from '#contract/patterns';
import { ProblemError, send } from '../../../lib/http.ts';
import { Button } from '../../../ui/button.tsx';
import { useToast } from '../../../ui/toast.tsx';
import { openWords } from '../checks/use-checks.ts';
import { patternQuery } from '../data/bench.queries.ts';
import { tallyVerdicts } from './bench-count.ts';
import { useDesk } from './use-desk.ts';

type Next = 'drafting' | 'in-proof';

/** On to the editor, saying what that leaves open; or back to the bench. */
export function ProofButton() {
  const { pattern, counts, bench, checks } = useDesk();
  const client = useQueryClient();
  const toast = useToast();
  const left = tallyVerdicts(pattern.lines, counts).reduce(
    (sum, one) => sum + (one.verdict === 'agrees' ? 0 : one.n),
    0,
  );
  const isInProof = pattern.state === 'in-proof';
  const open = openWords(left, checks);
  const leavesId = useId();

  const move = useMutation({
    mutationFn: async (state: Next) => {
      await bench.flush();
      const body = { state };
      return send(PatternHead, `/api/patterns/${pattern.id}/state`, { method: 'POST', version: pattern.version, body });
    },
    onSuccess: (_head, state) => {
      const still = open === '' ? '' : `, with ${open} still open`;
      toast(state === 'in-proof' ? `Sent to proof${still}` : 'Back at the bench');
    },
    onSettled: () => client.invalidateQueries({ queryKey: patternQuery(pattern.id).queryKey }),
  });

  if (!pattern.mayEdit || pattern.state === 'reading') return null;
  const empty = pattern.lines.length === 0;
  const notYet = move.isPending ? 'On its way' : empty ? 'Nothing is written yet' : undefined;
  return (
    <span className="flex items-center gap-3">
      {move.isError && (
        <span role="alert" className="small text-madder">
          {move.error instanceof ProblemError ? move.error.message : 'The server did not answer. Nothing has changed.'}
        </span>
      )}
      {open !== '' && !isInProof && !empty && (
        <span id={leavesId} className="small text-right leading-[15px] whitespace-nowrap text-walnut2 max-xl:sr-only">
          leaves open <br />
          {open}
        </span>
      )}
      <Button
        aria-describedby={open === '' || isInProof ? undefined : leavesId}
        kind={isInProof ? 'plain' : 'primary'}
        notYet={notYet}
        onClick={() => move.mutate(isInProof ? 'drafting' : 'in-proof')}
      >
        {isInProof ? 'Back to drafting' : 'Send to proof'}
      </Button>
    </span>
  );
}
