import { StrictMode } from 'react';
import { flushSync } from 'react-dom';
import { createRoot } from 'react-dom/client';
import type { PublicEdition } from '#contract/editions';
import './watch.css';
import { WatchApp, type Islands } from './watch-app.tsx';

const NAMES = ['tools', 'stage', 'work', 'rounds', 'dock'] as const;

/** The marked places of the server's page; null where this page has none of them (it names nothing). */
function findIslands(): Islands | null {
  const found = NAMES.map((name) => [name, document.querySelector<HTMLElement>(`[data-island="${name}"]`)] as const);
  return found.every(([, element]) => element) ? (Object.fromEntries(found) as unknown as Islands) : null;
}

const data = document.getElementById('edition')?.textContent;
const islands = findIslands();
if (data && islands) {
  // The server has parsed it by the contract before it was written into the page.
  const edition = JSON.parse(data) as PublicEdition;
  const root = createRoot(document.createElement('div'));
  // The server's words go in the same moment in which the living parts come: nothing is seen to be missing.
  for (const island of Object.values(islands)) island.replaceChildren();
  flushSync(() =>
    root.render(
      <StrictMode>
        <WatchApp edition={edition} islands={islands} />
      </StrictMode>,
    ),
  );
}
