import { Button } from '../../ui/button.tsx';
import { EXAMPLE } from '../text/example.ts';
import { useDesk } from '../use-desk.ts';

const STEPS = [
  'Paste a line or a whole pattern',
  'See what each round works out to',
  'Take the repair that fits',
  'Share it, or print it',
] as const;

/** Ruled paper with the first step on the first line, written as the trade writes. */
export function FirstSteps() {
  const { written, replaceAll } = useDesk();
  const isEmpty = written.text.trim() === '';
  return (
    <div className="ruled-paper min-h-0 grow overflow-hidden pt-12 max-lg:pb-12 print:hidden">
      <h3 className="h-12 px-5 font-serif text-[28px] leading-[48px] font-semibold max-sm:text-[22px]">
        {isEmpty ? 'Begin with a line' : 'No round or row found yet'}
      </h3>
      <ol>
        {STEPS.map((words, i) => (
          <li
            key={words}
            className={`flex min-h-12 items-center gap-x-4 px-5 ${i === 0 ? 'bar bg-woadwash' : 'text-walnut2'}`}
          >
            <b className="w-[44px] flex-none max-sm:w-8">R{i + 1}</b>
            <span className="font-serif text-[20px] leading-[26px] max-sm:text-[17px]">{words}</span>
            {i === 0 && isEmpty && (
              <Button kind="primary" className="ml-auto" onClick={() => replaceAll(EXAMPLE, 'An example put in')}>
                Try an example
              </Button>
            )}
          </li>
        ))}
      </ol>
    </div>
  );
}
