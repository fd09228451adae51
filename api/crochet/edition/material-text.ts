import { hookLabel } from '../trade/hooks.ts';
import { weightName } from '../trade/yarn-weights.ts';
import type { EditionMaterial } from './document.ts';

/** A material as it is stored: what is not known is left out. */
export interface SourceMaterial {
  readonly kind: EditionMaterial['kind'];
  readonly name: string;
  readonly details: {
    readonly amount?: string | undefined;
    readonly colour?: string | undefined;
    /** The trade's yarn weight, 0 to 7. */
    readonly weight?: number | undefined;
    readonly sizeMm?: number | undefined;
  };
}

/** "DK cotton, wheat: weight 3, light; 12 m" · "Hook 3.5 mm (US E-4)" · "Safety eyes 6 mm, 2". */
export function materialText({ kind, name, details }: SourceMaterial): string {
  const { amount, colour, weight, sizeMm } = details;
  const inMm = sizeMm === undefined || name.includes(`${sizeMm} mm`) ? name : `${name} ${sizeMm} mm`;
  const label = kind === 'hook' && sizeMm !== undefined && !name.includes('(') ? hookLabel(sizeMm) : '';
  const size = label === '' ? inMm : `${inMm} (${label})`;
  const what = [size, colour].filter(Boolean).join(', ');
  const grade = weight === undefined ? '' : `: weight ${weight}, ${weightName(weight)}`;
  return `${what}${grade}${amount ? `${grade ? '; ' : ', '}${amount}` : ''}`;
}
