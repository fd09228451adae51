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

const WEIGHTS = ['lace', 'super fine', 'fine', 'light', 'medium', 'bulky', 'super bulky', 'jumbo'] as const;

/** "DK cotton, wheat: weight 3, light; 12 m" · "Hook 2.5 mm" · "Safety eyes 6 mm, 2". */
export function materialText({ name, details }: SourceMaterial): string {
  const { amount, colour, weight, sizeMm } = details;
  const size = sizeMm === undefined || name.includes(`${sizeMm} mm`) ? name : `${name} ${sizeMm} mm`;
  const what = [size, colour].filter(Boolean).join(', ');
  const grade = weight === undefined ? '' : `: weight ${weight}, ${WEIGHTS[weight] ?? ''}`;
  return `${what}${grade}${amount ? `${grade ? '; ' : ', '}${amount}` : ''}`;
}
