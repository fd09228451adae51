import { paths } from '../../lib/paths.ts';
import { LinkButton } from '../../ui/link-button.tsx';
import { EmptyPaper } from '../../ui/notes.tsx';

/** For somebody who watches: a shelf belongs to a studio. */
export function NoStudio() {
  return (
    <main className="grow bg-sheet">
      <h1 className="sr-only">Shelf</h1>
      <EmptyPaper
        title="A shelf belongs to a studio"
        action={
          <LinkButton kind="primary" size="player" to={paths.account()}>
            Open a studio
          </LinkButton>
        }
      >
        <p>
          To write patterns, open a studio of your own, or ask to be invited to one. To make a piece, follow the address
          its maker gave you: no studio is needed for that.
        </p>
      </EmptyPaper>
    </main>
  );
}
