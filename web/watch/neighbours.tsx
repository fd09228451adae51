import { stepName, stepTotal, type Step } from './steps.ts';
import { useWatch } from './use-watch.ts';

/** Beside the map on a phone: the round before, the next, and the one after it. */
export function Neighbours() {
  const { steps, step } = useWatch();
  const at = steps.indexOf(step);
  return (
    <ul className="watch-neighbours">
      <Neighbour word="Before" step={steps[at - 1]} />
      <Neighbour word="Next" step={steps[at + 1]} />
      <Neighbour word="Then" step={steps[at + 2]} />
      <li>
        <a href="#all-lines">All lines, {steps.length}</a>
      </li>
    </ul>
  );
}

function Neighbour({ word, step }: { word: string; step: Step | undefined }) {
  const { state } = useWatch();
  if (!step) return null;
  return (
    <li>
      <span>
        {word}, <b>{stepName(step)}</b>
        <b className="tn">{stepTotal(step, state.terms)}</b>
      </span>
      <span className="watch-line-text">{step.line.text[state.terms]}</span>
    </li>
  );
}
