// Runs before anything is drawn, so that a page opened in the dark is never white first.
{
  const page = globalThis;
  let held = null;
  try {
    held = page.localStorage.getItem('roundelay.light');
  } catch {
    // A browser that keeps nothing follows the system.
  }
  const isDark = held ? held === 'dark' : page.matchMedia('(prefers-color-scheme: dark)').matches;
  page.document.documentElement.classList.toggle('dark', isDark);
}
