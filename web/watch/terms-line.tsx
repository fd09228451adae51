import { useWatch } from './use-watch.ts';

const holds = (text: string, word: string) =>
  new RegExp(`(^|[^A-Za-z])${word.replace(/[.*+?^${}()|[\]\\]/g, '\\$&')}([^A-Za-z]|$)`).test(text);

/**
 * Stands where somebody reads other terms than the speaker's: what is said for the stitches of this line, and what
 * that is to the reader. Nothing where the words are the same in both.
 */
export function TermsLine() {
  const { edition, state, step } = useWatch();
  const { terms } = state;
  if (terms === edition.terms) return null;
  const spoken = step.line.text[edition.terms];
  const unlike = edition.abbreviations.filter(
    ({ abbreviation }) =>
      abbreviation[terms] !== abbreviation[edition.terms] && holds(spoken, abbreviation[edition.terms]),
  );
  return (
    <p className="watch-terms">
      {unlike.length === 0
        ? `The recording speaks ${edition.terms} terms. This line is the same in both.`
        : unlike.map(({ abbreviation, name }) => (
            <span key={abbreviation.US}>
              Said: <i className="said">{name[edition.terms]}</i>, your <b>{abbreviation[terms]}</b>.{' '}
            </span>
          ))}
    </p>
  );
}
