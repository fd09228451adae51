import { type Token } from '../tokens.ts';
import { type Unit } from '../work/units.ts';
import { BARE } from './event.ts';

/** What a pattern makes of the tokens that it matched. */
export type Made =
  | {
      readonly type: 'unit';
      readonly options: readonly (readonly Unit[])[];
      readonly fills?: boolean;
      readonly reaches?: boolean;
    }
  | { readonly type: 'times'; readonly n: number }
  | { readonly type: 'around' | 'oneplace' | 'corner' | 'here' | 'again' | 'plain' | 'correction' | 'edge' | 'nothing' }
  /** The same at both ends of the line. */
  | { readonly type: 'ends'; readonly unit: Unit }
  /** All of the line in short: corner and side in turn; null is the corner. */
  | { readonly type: 'cycle'; readonly items: readonly (Unit | null)[] };

/** A pattern over letters, tried where the last one ended, and what it comes to; null where it does not hold after all. */
export interface Rule {
  readonly pattern: RegExp;
  readonly make: (matched: readonly Token[], letters: string) => Made | null;
}

/** The nth number among the tokens; one where there is none. */
export const number = (tokens: readonly Token[], nth = 0): number =>
  Number(tokens.filter((token) => token.kind === 'N')[nth]?.value ?? 1);
/** The nth stitch named among the tokens, else the one in hand. */
export const stitch = (tokens: readonly Token[], nth = 0): string =>
  String(tokens.filter((token) => token.kind === 'S')[nth]?.value ?? BARE);
export const isPlural = (token: Token | undefined): boolean => token?.text.endsWith('s') ?? false;

export const st = (name: string, times: number, inOne = 1): Unit => ({ type: 'stitch', stitch: name, inOne, times });
export const tog = (name: string, many: number, times = 1): Unit => ({ type: 'together', stitch: name, many, times });
export const unit = (...units: Unit[]): Made => ({ type: 'unit', options: [units] });
export const either = (...options: Unit[][]): Made => ({ type: 'unit', options });
export const fills = (...units: Unit[]): Made => ({ type: 'unit', options: [units], fills: true });
export const nothing: Made = { type: 'nothing' };
export const SPECIAL: ReadonlySet<string> = new Set(['bobble', 'popcorn', 'puff', 'cluster', 'picot']);
