import { type Terms } from '../span.ts';
import { nameOf } from '../stitches.ts';
import { type Sized, type Target } from './tree.ts';

const ORDINAL = (n: number): string => {
  const tail = n % 100 >= 11 && n % 100 <= 13 ? 'th' : (['th', 'st', 'nd', 'rd'][n % 10] ?? 'th');
  return `${String(n)}${tail}`;
};

/** A place in words: `next 6 sts`, `each ch-1 sp`, `3rd dc of shell`, `2nd ch from hook`. */
export function printPlace(target: Target, n: number, terms: Terms, sized?: Sized): string {
  const noun = nounOf(target, n, terms);
  const count = sized && (sized.length > 1 || sized[0] !== 1) ? `${sizedText(sized)} ` : n > 1 ? `${String(n)} ` : '';
  if (target.what === 'ring') return 'ring';
  if (target.what === 'edge') return 'the edge';
  if (target.what === 'loop')
    return target.line === undefined
      ? 'the free loops left'
      : `the front loops ${target.own ? 'of' : 'left in'} R${String(target.line)}`;
  switch (target.which) {
    case 'each':
      return `each ${noun}`;
    case 'every':
      return target.what === 'row-end'
        ? `every ${String(target.n ?? 2)} row ends`
        : `every ${ORDINAL(target.n ?? 2)} ${noun}`;
    case 'same':
      return `same ${target.what === 'other' ? 'place' : noun}`;
    case 'hook':
      return `${ORDINAL(target.n ?? 2)} ch from hook`;
    case 'nth':
      return `${ORDINAL(target.n ?? 1)} ${noun}${target.of ? ` of ${target.of}` : ''}`;
    case 'centre':
      return `centre ${noun}${target.of ? ` of ${target.of}` : ''}`;
    case 'skipped':
      return `the ${count}skipped sts`;
    case 'far':
      return 'other side';
    default:
      return target.what === 'mark' ? 'marked st' : `${target.which} ${count}${noun}`;
  }
}

const sizedText = ([first, ...others]: Sized): string =>
  others.length > 0 ? `${String(first)} (${others.join(', ')})` : String(first);

function nounOf(target: Target, n: number, terms: Terms): string {
  const s = n > 1 ? 's' : '';
  const corner = target.corner ? 'corner ' : '';
  switch (target.what) {
    case 'sp':
      if (target.chains !== undefined) return `ch-${String(target.chains)} sp${s}`;
      return `${corner}sp${s}`;
    case 'gap':
      return `gap${s}`;
    case 'ch':
      return 'ch';
    case 'st-or-ch':
      return 'st and ch';
    case 'row-end':
      return `row end${s}`;
    case 'group':
      return target.stitch ? nameOf(target.stitch, terms) : `group${s}`;
    default:
      return `${corner}${target.stitch ? nameOf(target.stitch, terms) : `st${s}`}`;
  }
}
