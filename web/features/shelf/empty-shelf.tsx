import { Plus } from 'lucide-react';
import { Link } from 'react-router-dom';
import { paths } from '../../lib/paths.ts';
import { LinkButton } from '../../ui/link-button.tsx';
import { FirstRounds } from './first-rounds.tsx';

const STEPS = [
  ['Add a recording and its transcript', null],
  ['Mark where each round starts', 'about as long as the clip'],
  [
    'Mend the lines that do not agree',
    <>
      <i className="font-serif">said</i>, <span className="font-serif">written</span>, <b>worked out</b>
    </>,
  ],
  ['Have it proofread, then print it', 'one edition, one page to watch'],
] as const;

/** Ruled paper and four rounds, the first of them lit: the notation itself teaches what comes. */
export function EmptyShelf({ mayCreate }: { mayCreate: boolean }) {
  return (
    <div className="ruled-paper relative grow overflow-hidden sm:grid sm:grid-cols-[minmax(0,540px)_minmax(0,1fr)]">
      <div className="flex justify-center pt-24 max-lg:hidden">
        <FirstRounds />
      </div>
      <div aria-hidden className="double-before absolute inset-y-0 right-[268px] max-lg:hidden" />
      <section className="pt-24 max-lg:col-span-2 max-sm:pt-12">
        <h2 className="h-12 px-5 font-serif text-[28px] leading-[48px] font-semibold">Begin with the ring</h2>
        <ol>
          {STEPS.map(([words, beside], i) => (
            <li
              key={words}
              className={`flex min-h-12 flex-wrap items-center gap-x-4 px-5 ${i === 0 ? 'bar bg-woadwash py-1.5' : 'text-walnut2'}`}
            >
              <b className="w-[72px] max-sm:w-8">R{i + 1}</b>
              <span className="min-w-0 grow font-serif text-[20px] leading-[28px] max-sm:text-[17px]">{words}</span>
              <span className="w-[240px] max-sm:w-full max-sm:pl-12">
                {i === 0 && mayCreate ? (
                  <LinkButton kind="primary" size="player" icon={Plus} keys={['N']} to={paths.newPattern()}>
                    New pattern
                  </LinkButton>
                ) : (
                  beside
                )}
              </span>
            </li>
          ))}
        </ol>
        <div className="px-5 sm:pl-[108px]">
          <p className="mt-12 leading-[24px] text-walnut2 sm:leading-[48px] lg:pr-[268px]">
            No transcript? Most film editors export WebVTT or SubRip. Text with clock times will do.
          </p>
          <p className="flex h-12 flex-wrap items-center gap-x-4.5 gap-y-2">
            {mayCreate && (
              <Link className="link" to={paths.writtenPattern()}>
                Begin with a written pattern
              </Link>
            )}
            <a className="link" href={paths.count()}>
              Count a pattern
            </a>
            <Link className="link" to={paths.studio()}>
              Ask an editor in
            </Link>
          </p>
        </div>
      </section>
    </div>
  );
}
