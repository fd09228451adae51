import { type Check } from '#crochet';
import { type LeftCheck } from '#contract/checks';
import { useDesk } from '../desk/use-desk.ts';
import { reopenCheck } from './check-deeds.ts';
import { CheckWords } from './check-refs.tsx';

/** A finding that stays: the proofreader's word for it, the reason, and the way back. */
export function LeftCheckRow({ check, left, onSettled }: { check: Check; left: LeftCheck; onSettled: () => void }) {
  const desk = useDesk();
  return (
    <li className="grid grid-cols-[36px_minmax(0,1fr)] gap-x-1 border-b border-feint px-3.5 py-2 text-walnut2">
      <span aria-hidden className="said h-[21px] border-b-[1.5px] border-dotted border-walnut2 text-walnut">
        stet
      </span>
      <div>
        <CheckWords check={check} />
        <p>
          Left as it is: <span className="wr text-walnut">{left.reason}</span>{' '}
          {desk.pattern.mayEdit && (
            <button
              type="button"
              className="link ml-2"
              onClick={() => {
                reopenCheck(desk, left);
                onSettled();
              }}
            >
              Open it again
            </button>
          )}
        </p>
      </div>
    </li>
  );
}
