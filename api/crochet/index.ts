/**
 * The one door of the pattern library: written shorthand to a tree, a tree worked stitch by stitch, verdicts and
 * repairs. Pure functions without a framework, used by the server and the browser alike.
 */
export { type Span, type Terms } from './span.ts';
export type * from './language/tree.ts';
export type * from './count/input.ts';
export type * from './count/result.ts';
export type * from './language/pattern/pattern-text.ts';
export { STITCHES, nameOf, stitchOf, type StitchRow } from './stitches.ts';
export { readLine, type ReadOptions } from './language/read-line.ts';
export { countPattern } from './count/pattern.ts';
export { type Cue } from './transcript/cue.ts';
export type * from './transcript/draft.ts';
export { wordsOf, type Word } from './transcript/words.ts';
export * from './transcript/held-against.ts';
export { findShifts, shiftMoment, type Shift, type Shifts } from './transcript/moment-shifts.ts';
export { readTranscript } from './transcript/read-transcript.ts';
export { alignWords, plainWord } from './transcript/align-words.ts';
export { placeCorrections, type CorrectedCue, type PlacedCorrection } from './transcript/correct-words.ts';
export { matchLines, matchPieces } from './transcript/match-draft.ts';
export {
  readStretch,
  type StretchReading,
  type StretchSetting,
  type TimedHeardCue,
} from './transcript/read-stretch.ts';
export { followWords } from './transcript/shift-moments.ts';
export { inHeardNumbers, wordsAsHeard, type HeardCue, type HeardWord } from './transcript/words-as-heard.ts';
export { spell as spellWork } from './transcript/work/units.ts';
export * from './edition/index.ts';
export { broughtCautions, type BroughtCaution, type CautionSource } from './checks/cautions.ts';
export { placeTotal } from './language/place-total.ts';
export { printLine, houseStyle, type PrintOptions } from './language/print.ts';
export { printTotals, readTotals } from './language/totals-text.ts';
export { translate } from './language/translate.ts';
export { abbreviationsUsed, type Abbreviation } from './language/abbreviations.ts';
export { repairsFor } from './count/repairs.ts';
export { readPattern } from './language/pattern/read-pattern.ts';
export { countReport, inputOf } from './count/report.ts';
export { HOOKS, hookLabel, type HookSize } from './trade/hooks.ts';
export { YARN_WEIGHTS, type YarnWeight } from './trade/yarn-weights.ts';
export type * from './checks/source.ts';
export { CHECK_KINDS, type Check, type CheckChange, type CheckKind, type CheckRef, type Mend } from './checks/check.ts';
export { checkPattern, settleChecks, type Checked, type LeftCheck } from './checks/check-pattern.ts';
