import { readFileSync, statSync } from 'node:fs';
import path from 'node:path';
import { z } from 'zod';
import { WEB_DIR } from '../../http/web-pages.ts';
import { html, type Html } from './html.ts';

/** The watch page's entry as the build's manifest names it. */
const ENTRY = 'watch/main.tsx';
const Manifest = z.record(
  z.string(),
  z.object({
    file: z.string(),
    css: z.array(z.string()).default([]),
    imports: z.array(z.string()).default([]),
    assets: z.array(z.string()).default([]),
  }),
);
type Manifest = z.infer<typeof Manifest>;

let known: { readonly changed: number; readonly head: Html } | null = null;

/** Everything the entry loads at once, itself first. */
function reach(manifest: Manifest, name: string, seen = new Set<string>()): Set<string> {
  if (seen.has(name) || !manifest[name]) return seen;
  seen.add(name);
  for (const next of manifest[name].imports) reach(manifest, next, seen);
  return seen;
}

function builtHead(manifest: Manifest): Html {
  const chunks = [...reach(manifest, ENTRY)].map((name) => manifest[name]!);
  const css = [...new Set(chunks.flatMap((chunk) => chunk.css))];
  const [entry, ...rest] = chunks;
  return html`${css.map((file) => html`<link rel="stylesheet" href="/${file}" />`)}
  ${rest.map((chunk) => html`<link rel="modulepreload" href="/${chunk.file}" />`)}
  ${entry && html`<script type="module" src="/${entry.file}"></script>`}`;
}

/**
 * The style sheets and the script of the watch page: from the build's manifest, read anew when it was built anew; from
 * Vite's own server while developing. A page without a build still has all its words.
 */
export function pageAssets(mode: 'built' | 'vite', dir = WEB_DIR): Html {
  if (mode === 'vite') {
    return html`<link rel="stylesheet" href="/watch/watch.css" />
      <script type="module">
        import { injectIntoGlobalHook } from '/@react-refresh';
        injectIntoGlobalHook(window);
        window.$RefreshReg$ = () => {};
        window.$RefreshSig$ = () => (type) => type;
      </script>
      <script type="module" src="/@vite/client"></script>
      <script type="module" src="/${ENTRY}"></script>`;
  }
  const file = path.join(dir, '.vite/manifest.json');
  const changed = statSync(file, { throwIfNoEntry: false })?.mtimeMs;
  if (changed === undefined) return html``;
  if (known?.changed !== changed) {
    known = { changed, head: builtHead(Manifest.parse(JSON.parse(readFileSync(file, 'utf8')))) };
  }
  return known.head;
}
