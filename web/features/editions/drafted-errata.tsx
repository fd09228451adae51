import type { Publish, PublishDesk } from '#contract/editions';
import { Field } from '../../ui/field.tsx';
import { kindWords, Now, Was } from './erratum-rows.tsx';

export type Settled = readonly Publish['errata'][number][];

/** Errata drafted from the difference to the edition before: ticked ones are told, each with a reason if one likes. */
export function DraftedErrata({
  desk,
  settled,
  onSettle,
}: {
  desk: PublishDesk;
  settled: Settled;
  onSettle: (next: Settled) => void;
}) {
  const set = (index: number, part: Partial<Settled[number]>) =>
    onSettle(settled.map((one) => (one.index === index ? { ...one, ...part } : one)));
  const told = settled.filter((one) => one.told).length;
  return (
    <div>
      <h3 className="label">
        Changed since edition {desk.number - 1}: {told} told, {settled.length - told} left out
      </h3>
      <ul>
        {desk.errata.map((erratum, index) => {
          const mine = settled[index];
          const id = `erratum-${index}`;
          return (
            <li key={id} className="grid grid-cols-[24px_minmax(0,1fr)] gap-x-1 border-b border-feint py-2">
              <input
                id={id}
                type="checkbox"
                className="tick mt-1"
                checked={mine?.told ?? false}
                onChange={({ target }) => set(index, { told: target.checked })}
              />
              <div>
                <label htmlFor={id} className="font-bold">
                  {erratum.place} <span className="font-normal text-walnut2">{kindWords(erratum.weight)}</span>
                </label>
                <p className="wr">
                  <Was erratum={erratum} />
                </p>
                <p className="wr">
                  <Now erratum={erratum} />
                </p>
                {mine?.told && (
                  <Field
                    label={`Why ${erratum.place} changed`}
                    hideLabel
                    className="field-row mt-1"
                    placeholder="Why, in a few words (or nothing)"
                    maxLength={300}
                    value={mine.why}
                    onChange={({ target }) => set(index, { why: target.value })}
                  />
                )}
              </div>
            </li>
          );
        })}
      </ul>
    </div>
  );
}
