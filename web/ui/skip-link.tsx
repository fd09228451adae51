/** The first stop of the Tab key: past the spine, to the page. */
export function SkipLink({ to = 'page' }: { to?: string }) {
  return (
    <a
      href={`#${to}`}
      className="btn btn-primary sr-only z-50 focus-visible:not-sr-only focus-visible:fixed! focus-visible:top-2 focus-visible:left-2"
    >
      Skip to the page
    </a>
  );
}
