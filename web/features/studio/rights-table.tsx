import { Check } from 'lucide-react';
import { Icon } from '../../ui/icon.tsx';

/** As the policies on the server have it. */
const RIGHTS: readonly (readonly [what: string, owner: boolean, creator: boolean, editor: boolean])[] = [
  ['Read and hear everything', true, true, true],
  ['Write and mend lines, mark moments', true, true, true],
  ['Begin, archive and bin patterns', true, true, false],
  ['Upload recordings', true, true, false],
  ['Publish an edition', true, true, false],
  ['Invite, change roles', true, false, false],
  ['The look of all sheets', true, false, false],
];

/** Who may do what in a studio. */
export function RightsTable() {
  return (
    <table className="w-full border-t border-rule">
      <thead>
        <tr className="h-[38px] border-b border-rule">
          <th scope="col" className="h-panel px-4 text-left max-sm:px-3">
            Who may do what
          </th>
          {['owner', 'creator', 'editor'].map((role) => (
            <th key={role} scope="col" className="w-[120px] font-bold max-sm:w-[68px]">
              {role}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {RIGHTS.map(([what, ...marks]) => (
          <tr key={what} className="h-[31px] border-b border-feint">
            <th scope="row" className="px-4 text-left font-normal max-sm:px-3">
              {what}
            </th>
            {marks.map((may, i) => (
              <td key={i} className="text-center">
                <span className="sr-only">{may ? 'yes' : 'no'}</span>
                {may ? (
                  <span className="inline-block align-middle text-moss">
                    <Icon of={Check} size={16} />
                  </span>
                ) : (
                  <span aria-hidden className="text-walnut3">
                    –
                  </span>
                )}
              </td>
            ))}
          </tr>
        ))}
      </tbody>
      <caption className="caption-bottom px-4 py-2.5 text-left text-walnut2 max-sm:px-3">
        A role taken away counts from the next click.
      </caption>
    </table>
  );
}
