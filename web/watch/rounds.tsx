import { useState } from 'react';
import type { PublicLine, PublicPiece } from '#contract/editions';
import { cx } from '../lib/class-names.ts';
import { type Step } from './steps.ts';
import { useWatch } from './use-watch.ts';

/** The whole piece in rows with boxes: to see what is done, to tick, and to go anywhere. */
export function Rounds() {
  const { edition } = useWatch();
  return (
    <div id="all-lines">
      {edition.pieces.map((piece) => (
        <PieceRounds key={piece.id} piece={piece} />
      ))}
    </div>
  );
}

function PieceRounds({ piece }: { piece: PublicPiece }) {
  const { step } = useWatch();
  const [chosen, choose] = useState(1);
  const [seen, setSeen] = useState(step);
  // The copy being worked comes to the front when the place moves to it; another may be looked at meanwhile.
  if (seen !== step) {
    setSeen(step);
    if (step.piece === piece && step.copy !== chosen) choose(step.copy);
  }
  const half = Math.ceil(piece.lines.length / 2);
  const columns = piece.lines.length > 5 ? [piece.lines.slice(0, half), piece.lines.slice(half)] : [piece.lines];
  return (
    <section className="watch-piece">
      <h2>
        {piece.name}{' '}
        {piece.make > 1 && (
          <select
            aria-label={`Which ${piece.name}`}
            className="field field-row watch-copies"
            value={chosen}
            onChange={(event) => choose(Number(event.target.value))}
          >
            {Array.from({ length: piece.make }, (_, i) => (
              <option key={i} value={i + 1}>
                {i + 1} of {piece.make}
              </option>
            ))}
          </select>
        )}
      </h2>
      <div className="watch-columns">
        {columns.map((lines, i) => (
          <ol key={i} className="watch-lines" start={i * half + 1}>
            {lines.map((line) => (
              <LineRow key={line.shortId} piece={piece} line={line} copy={chosen} />
            ))}
          </ol>
        ))}
      </div>
    </section>
  );
}

/** Steps of one line for one copy: several where it is a range. */
function stepsOfLine(steps: readonly Step[], line: PublicLine, copy: number): readonly Step[] {
  return steps.filter((step) => step.line === line && step.copy === copy);
}

function LineRow({ piece, line, copy }: { piece: PublicPiece; line: PublicLine; copy: number }) {
  const { steps, state, step, act, show } = useWatch();
  const own = stepsOfLine(steps, line, copy);
  const done = own.filter(({ key }) => state.done.has(key)).length;
  const isDone = own.length > 0 && done === own.length;
  const isHere = step.line === line && step.copy === copy;
  const text = line.text[state.terms];
  const total = line.total?.[state.terms] ?? '';
  const name = line.label === '' ? text : line.label;
  const first = own.find(({ key }) => !state.done.has(key)) ?? own[0];
  return (
    <li
      id={copy === 1 ? line.shortId : undefined}
      className={cx('watch-line', `watch-line-${line.kind}`, isHere && 'bar watch-here', isDone && 'watch-done')}
      {...(isHere && { 'aria-current': 'step' as const })}
    >
      {own.length > 0 && (
        <label className="watch-box">
          <input
            type="checkbox"
            className="tick"
            checked={isDone}
            ref={(box) => {
              if (box) box.indeterminate = done > 0 && !isDone;
            }}
            aria-label={`${piece.name} ${name}${piece.make > 1 ? `, ${copy} of ${piece.make}` : ''}`}
            onChange={() => act({ kind: 'mark', keys: own.map(({ key }) => key), done: !isDone })}
          />
        </label>
      )}
      {first ? (
        <button type="button" className="watch-line-go" onClick={() => show(first)}>
          {line.label !== '' && <b className="watch-line-label">{line.label}</b>}
          <span className="watch-line-text">{text}</span>
          {own.length > 1 && done > 0 && !isDone && (
            <small>
              {done} of {own.length}
            </small>
          )}
        </button>
      ) : (
        <p className="watch-line-text">{text}</p>
      )}
      <span className="watch-line-total tn">
        <b>{total}</b>
        {line.each && total !== '' && ' each'}
      </span>
    </li>
  );
}
