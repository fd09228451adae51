/// <reference lib="webworker" />
/**
 * The service worker of the count page, and of nothing else: its scope is `/count`. It keeps the page and the files it
 * is made of, whose names are written in while it is built; it never looks at any other request.
 */
declare const self: ServiceWorkerGlobalScope;

/** Written in by the build: the page itself and every file it names. */
const FILES: readonly string[] = '__COUNT_FILES__'.split(' ');
const CACHE = 'count-__COUNT_HASH__';
const PAGE = '/count';
/** The page that is still open may need one of its own files: the version before stays until the next. */
const KEPT_VERSIONS = 2;

/** Files whose names carry their content are taken from an older version if it has them. */
async function fetchFile(file: string): Promise<Response> {
  const kept = file.startsWith('/assets/') ? await caches.match(file) : undefined;
  return kept ?? fetch(file, { cache: 'reload', credentials: 'same-origin' });
}

async function fill(): Promise<void> {
  const answers = await Promise.all(FILES.map(async (file) => [file, await fetchFile(file)] as const));
  if (answers.some(([, answer]) => !answer.ok)) throw new Error('a file of the page is missing');
  const cache = await caches.open(CACHE);
  await Promise.all(answers.map(([file, answer]) => cache.put(file, answer)));
}

async function dropOld(): Promise<void> {
  const versions = (await caches.keys()).filter((name) => name.startsWith('count-') && name !== CACHE);
  await Promise.all(
    versions.slice(0, Math.max(0, versions.length - (KEPT_VERSIONS - 1))).map((name) => caches.delete(name)),
  );
}

self.addEventListener('install', (event) => {
  event.waitUntil(fill().then(() => self.skipWaiting()));
});
self.addEventListener('activate', (event) => {
  event.waitUntil(dropOld().then(() => self.clients.claim()));
});
self.addEventListener('fetch', (event) => {
  const { request } = event;
  const url = new URL(request.url);
  if (request.method !== 'GET' || url.origin !== self.location.origin) return;
  const isPage = request.mode === 'navigate' && (url.pathname === PAGE || url.pathname === `${PAGE}/`);
  const file = isPage ? PAGE : url.pathname;
  if (!FILES.includes(file) && !file.startsWith('/assets/')) return;
  event.respondWith(
    caches
      .open(CACHE)
      .then((cache) => cache.match(file))
      .then((kept) => kept ?? caches.match(file))
      .then((kept) => kept ?? fetch(request)),
  );
});
