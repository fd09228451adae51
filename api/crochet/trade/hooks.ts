/** A hook of the trade. The metric size is what counts; the letter and the numbers are labels of it. */
export interface HookSize {
  readonly mm: number;
  /** "E-4"; null where the size has none in the US. */
  readonly us: string | null;
  /** The number it had in Britain and Canada. */
  readonly oldUk: string | null;
}

const hook = (mm: number, us: string | null, oldUk: string | null): HookSize => ({ mm, us, oldUk });

/** Hooks by their size, smallest first. No millimetres are ever taken from a letter: makers differ in them. */
export const HOOKS: readonly HookSize[] = [
  hook(2, null, '14'),
  hook(2.25, 'B-1', '13'),
  hook(2.5, null, '12'),
  hook(2.75, 'C-2', '11 or 12'),
  hook(3, null, '11'),
  hook(3.25, 'D-3', '10'),
  hook(3.5, 'E-4', '9'),
  hook(3.75, 'F-5', null),
  hook(4, 'G-6', '8'),
  hook(4.5, '7', '7'),
  hook(5, 'H-8', '6'),
  hook(5.5, 'I-9', '5'),
  hook(6, 'J-10', '4'),
  hook(6.5, 'K-10½', '3'),
  hook(7, null, '2'),
  hook(8, 'L-11', '0'),
  hook(9, 'M/N-13', '00'),
  hook(10, 'N/P-15', '000'),
  hook(11.5, 'P-16', null),
  hook(12, 'O', null),
  hook(15, 'P/Q', null),
  hook(16, 'Q', null),
];

const BY_MM = new Map(HOOKS.map((size) => [size.mm, size]));

/**
 * What a hook of so many millimetres is called besides; empty where it has no other name.
 *
 * @example hookLabel(3.5) // 'US E-4, old UK 9'
 */
export function hookLabel(mm: number): string {
  const { us = null, oldUk = null } = BY_MM.get(mm) ?? {};
  return [us === null ? '' : `US ${us}`, oldUk === null ? '' : `old UK ${oldUk}`].filter(Boolean).join(', ');
}
