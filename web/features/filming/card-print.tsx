import { type CardPiece } from './card-lines.ts';

/** The card on paper: every line large, black on white, none cut by the end of a page. */
export function CardPrint({ title, terms, pieces }: { title: string; terms: string; pieces: readonly CardPiece[] }) {
  return (
    <div className="card-print" aria-hidden>
      <header>
        <h1>{title}</h1>
        <p>{terms} terms. Say the number first and the total last.</p>
      </header>
      {pieces.map((piece) => (
        <section key={piece.id}>
          <h2>
            {piece.name}
            {piece.make > 1 && <span>make {piece.make}</span>}
          </h2>
          {piece.lines.map((line) => (
            <div key={line.id} className="card-print-line">
              <b>{line.name}</b>
              <p>
                {line.text}
                {line.note !== '' && <small>{line.note}</small>}
              </p>
              <b>{line.filmed ? line.total : 'not filmed'}</b>
            </div>
          ))}
        </section>
      ))}
    </div>
  );
}
