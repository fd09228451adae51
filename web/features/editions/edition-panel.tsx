import { Captions, FileText, Monitor } from 'lucide-react';
import type { Edition } from '#contract/editions';
import { formatBytes } from '../../lib/time.ts';
import { Icon } from '../../ui/icon.tsx';
import { kindWords, Now, Was } from './erratum-rows.tsx';
import { WithdrawRow } from './editions-list.tsx';

/** One edition: what it told, what went out with it, and the way to take it back. */
export function EditionPanel({
  patternId,
  edition,
  code,
  address,
  mayManage,
}: {
  patternId: string;
  edition: Edition;
  code: string;
  address: string;
  mayManage: boolean;
}) {
  return (
    <>
      <section aria-labelledby="errata">
        <div className="panel-head">
          <h2 id="errata" className="h-panel">
            {edition.number === 1 ? 'First print' : `Errata, told with edition ${edition.number}`}
          </h2>
        </div>
        {edition.errata.length === 0 ? (
          <p className="px-3.5 py-4 text-walnut2">
            {edition.number === 1 ? 'There is nothing before it.' : 'Nothing was told.'}
          </p>
        ) : (
          <div className="overflow-x-auto">
            <table className="w-full min-w-[560px]">
              <thead>
                <tr className="border-b border-rule text-left text-walnut2">
                  <th scope="col" className="px-3.5 py-2 font-normal">
                    Place
                  </th>
                  <th scope="col" className="py-2 font-normal">
                    As printed, edition {edition.number - 1}
                  </th>
                  <th scope="col" className="border-l border-double py-2 pl-3.5 font-normal">
                    Should read, edition {edition.number}
                  </th>
                  <th scope="col" className="py-2 pl-3.5 font-normal">
                    Kind
                  </th>
                </tr>
              </thead>
              <tbody>
                {edition.errata.map((erratum, i) => (
                  <tr key={i} className="border-b border-feint align-top">
                    <th scope="row" className="px-3.5 py-2 text-left">
                      {erratum.place}
                    </th>
                    <td className="wr py-2 pr-3">
                      <Was erratum={erratum} />
                    </td>
                    <td className="wr border-l border-double py-2 pr-3 pl-3.5">
                      <Now erratum={erratum} />
                    </td>
                    <td className="py-2 pr-3.5 pl-3.5 text-walnut2">
                      {kindWords(erratum.weight)}
                      {erratum.why !== '' && <span className="block">{erratum.why}</span>}
                    </td>
                  </tr>
                ))}
              </tbody>
            </table>
          </div>
        )}
      </section>
      <section aria-labelledby="went-out" className="border-t border-rule">
        <div className="panel-head justify-between">
          <h2 id="went-out" className="h-panel">
            What went out
          </h2>
          <span className="text-walnut2">frozen at publishing, one number for all</span>
        </div>
        <ul>
          <Out icon={Monitor} name="Watch page" size={`${edition.moments} moments`}>
            <a className="link break-all" href={edition.path}>{`${address}/${edition.number}`}</a>
          </Out>
          {edition.files.length === 0 && (
            <Out icon={FileText} name="Sheet" size="in a moment">
              Being drawn; the page draws it itself meanwhile.
            </Out>
          )}
          {edition.files.map(({ paper, terms, bytes }) => (
            <Out key={paper} icon={FileText} name={`Sheet, ${paper}`} size={formatBytes(bytes)}>
              <a
                className="link"
                href={`/api/editions/${code}/${edition.number}/sheet.pdf?paper=${paper}&terms=${terms}`}
              >
                PDF in {terms} terms
              </a>
            </Out>
          ))}
          <Out icon={Captions} name="Captions" size={`${edition.captions} captions`}>
            On the watch page
          </Out>
        </ul>
        {mayManage && (
          <div className="p-3.5">
            <WithdrawRow key={edition.number} patternId={patternId} edition={edition} />
          </div>
        )}
      </section>
    </>
  );
}

function Out({
  icon,
  name,
  size,
  children,
}: {
  icon: typeof FileText;
  name: string;
  size: string;
  children: React.ReactNode;
}) {
  return (
    <li className="flex flex-wrap items-center gap-x-3 border-b border-feint px-3.5 py-2.5">
      <Icon of={icon} size={18} />
      <b className="w-32">{name}</b>
      <span className="grow">{children}</span>
      <span className="text-walnut2">{size}</span>
    </li>
  );
}
