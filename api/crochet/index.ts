/**
 * The one door of the pattern library: written shorthand to a tree, a tree worked stitch by stitch, verdicts and
 * repairs. Pure functions without a framework, used by the server and the browser alike.
 */
export { type Span, type Terms } from './span.ts';
export type * from './language/tree.ts';
export type * from './count/input.ts';
export type * from './count/result.ts';
export type * from './language/pattern/pattern-text.ts';
