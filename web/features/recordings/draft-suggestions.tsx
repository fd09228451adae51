import type { ReadingSummary } from '#contract/recordings';
import { formatMoment } from '../../lib/time.ts';

const WORDS: Readonly<Record<ReadingSummary['suggestions'][number]['kind'], string>> = {
  hook: 'Hook',
  yarn: 'Yarn',
  notion: 'Notion',
  gauge: 'Gauge',
  caution: 'Caution',
  technique: 'Pointer',
};

/** What was said besides the rounds: materials, cautions, and where another recording was pointed to. */
export function DraftSuggestions({ suggestions }: Pick<ReadingSummary, 'suggestions'>) {
  if (suggestions.length === 0) return null;
  return (
    <details className="border-b border-feint px-3.5 py-2">
      <summary className="cursor-pointer">
        <b>Also said</b>{' '}
        <span className="text-walnut2">
          {suggestions.length} {suggestions.length === 1 ? 'thing' : 'things'} for the sheet
        </span>
      </summary>
      <dl className="mt-1.5 grid grid-cols-[64px_minmax(0,1fr)] gap-y-1">
        {suggestions.map(({ kind, text, atMs }) => (
          <div key={`${kind}${atMs}${text}`} className="contents">
            <dt className="small leading-[22px]! text-walnut2">{WORDS[kind]}</dt>
            <dd className="said min-w-0">
              {text} <span className="small font-sans text-walnut3 not-italic">{formatMoment(atMs)}</span>
            </dd>
          </div>
        ))}
      </dl>
    </details>
  );
}
