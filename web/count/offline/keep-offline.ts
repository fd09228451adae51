/**
 * Keeps the page and all it is made of in the browser, so that it opens without a network. A newer one is fetched in
 * the background and is there the next time. Where the browser cannot, the page works as long as it is open.
 */
export function keepOffline(): void {
  if (!import.meta.env.PROD || !('serviceWorker' in navigator)) return;
  window.addEventListener('load', () => {
    void navigator.serviceWorker.register('/count-offline.js', { scope: '/count' }).catch(() => undefined);
  });
}
