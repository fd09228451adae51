import { type ReactNode } from 'react';

/** What can be seen of it: the clip, under it what the totals make. */
export function SidePanel({ clip }: { clip: ReactNode }) {
  return <div className="flex min-h-0 flex-col overflow-y-auto border-l border-rule">{clip}</div>;
}
