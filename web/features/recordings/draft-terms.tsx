import type { ReadingSummary } from '#contract/recordings';
import { Switch } from '../../ui/switch.tsx';

/** In which terms the recording is spoken, why the reading thinks so, and the way to say otherwise. */
export function DraftTerms(props: {
  summary: Pick<ReadingSummary, 'terms' | 'termsReason'>;
  mayChange: boolean;
  isReading: boolean;
  onChange: (terms: 'US' | 'UK') => void;
}) {
  const { summary, mayChange, isReading, onChange } = props;
  return (
    <div className="flex flex-wrap items-center gap-x-3 gap-y-1 border-b border-feint px-3.5 py-2">
      <span>
        <b>Spoken in {summary.terms} terms.</b> <span className="text-walnut2">{summary.termsReason}</span>
      </span>
      {mayChange && (
        <span className="ml-auto">
          <Switch
            label="Spoken in"
            value={summary.terms}
            options={[
              { value: 'US', label: 'US' },
              { value: 'UK', label: 'UK' },
            ]}
            onChange={onChange}
          />
        </span>
      )}
      <span role="status" className="small basis-full text-walnut2 empty:hidden">
        {isReading ? 'Reading it again.' : ''}
      </span>
    </div>
  );
}
