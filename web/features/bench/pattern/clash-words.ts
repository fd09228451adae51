import { type Line } from '#contract/rows';
import { formatTenths } from '../../../lib/time.ts';
import { type Conflict } from '../data/bench-types.ts';
import { lineName } from '../desk/line-name.ts';

const KINDS: Record<Conflict['kind'], string> = {
  pattern: 'the pattern’s own page',
  piece: 'a piece',
  line: 'a line',
  mark: 'a moment',
  material: 'a material',
  caution: 'a caution',
  note: 'a note',
  'special-stitch': 'a special stitch',
  'left-check': 'a check that was left',
};

/** What the clash is about, by the name it has on the bench: `R9`, `Body`, `the moment at 12:46.2`. */
export function conflictTitle({ kind, base }: Pick<Conflict, 'kind' | 'base'>): string {
  if (kind === 'line') return lineName(base as unknown as Line) || KINDS.line;
  if (kind === 'piece' && typeof base.name === 'string') return base.name;
  if (kind === 'mark' && typeof base.startMs === 'number') return `the moment at ${formatTenths(base.startMs)}`;
  return KINDS[kind];
}

const FIELDS: Record<string, string> = {
  text: 'instruction',
  written: 'written',
  said: 'said',
  from: 'from',
  to: 'to',
  kind: 'what it is',
  note: 'note',
  name: 'name',
  make: 'make',
  worked: 'worked in',
  title: 'title',
  terms: 'terms',
  startMs: 'begins, in thousandths of a second',
};

/** A field's name on the bench. */
export const fieldWords = (field: string): string =>
  FIELDS[field] ?? field.replace('details.', '').replace(/[A-Z]/g, (c) => ` ${c.toLowerCase()}`);
