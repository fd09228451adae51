/** Stands in every edition, whatever its cautions are. */
export const DEFERRAL =
  'The rules where you live apply to you as the maker: ask your local product-safety office or a licensed test house. ' +
  'This sheet is not a safety certificate.';

const TITLES: Readonly<Record<string, string>> = {
  'small-parts': 'Small parts',
  flame: 'Flame',
  wire: 'Wire',
  cords: 'Cords and loops',
  heat: 'Heat',
  sleep: 'Sleep',
  handles: 'Handles',
  pets: 'Pets',
  teething: 'Teething',
};

/** What is printed in bold before a caution; empty for one of the creator's own. */
export const cautionTitle = (kind: string): string => TITLES[kind] ?? '';
