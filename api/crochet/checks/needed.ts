import { type Check, finding } from './check.ts';
import { type Scan } from './scan.ts';

/** What every sheet has to say before a stitch is made. */
export function checkNeeded({ source }: Scan): Check[] {
  const { materials, details } = source;
  const place = 'sheet' as const;
  const yarns = materials.filter(({ kind }) => kind === 'yarn');
  const said = (text: string) =>
    /\b(?:lace|fingering|sport|dk|worsted|aran|chunky|bulky|jumbo|weight ?\d)\b/i.test(text);
  const without = yarns.filter(
    ({ name, details: own }) => own.weight === undefined && !said(`${name} ${own.amount ?? ''}`),
  );
  return [
    ...(materials.some(({ kind }) => kind === 'hook')
      ? []
      : [finding('hook-missing', 'The materials name no hook.', { place })]),
    ...(yarns.length > 0 && without.length === 0
      ? []
      : [
          finding(
            'weight-missing',
            yarns.length === 0
              ? 'The materials name no yarn.'
              : `${without.map(({ name }) => name).join(', ')}: no yarn weight is given.`,
            { place },
          ),
        ]),
    ...(details.finishedSize.trim() === '' ? [finding('size-missing', 'No finished size is given.', { place })] : []),
  ];
}
