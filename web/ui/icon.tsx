import { type LucideIcon } from 'lucide-react';

/** An outline from lucide at the house's stroke (1.4 px real, 14 to 22 px). Decoration: the words beside it say it. */
export function Icon({ of: Glyph, size = 18, className }: { of: LucideIcon; size?: number; className?: string }) {
  return <Glyph size={size} strokeWidth={1.4} nonScalingStroke aria-hidden {...(className ? { className } : {})} />;
}

/** Neither face has an arrow in its Latin subset, so it is drawn. Read out as "to". */
export function Arrow({ width = 14 }: { width?: number }) {
  return (
    <>
      <svg
        width={width}
        height="10"
        viewBox="0 0 14 10"
        className="mx-1 inline-block"
        fill="none"
        stroke="currentColor"
        aria-hidden
        strokeWidth="1.4"
        strokeLinecap="round"
        strokeLinejoin="round"
      >
        <path d="M1 5h12M9.5 1.8 13 5 9.5 8.2" />
      </svg>
      <span className="sr-only"> to </span>
    </>
  );
}
