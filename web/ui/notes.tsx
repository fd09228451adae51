import { type ReactNode } from 'react';

/** What went wrong in bold, what is kept, one way on. */
export function ErrorNote({ what, children, action }: { what: string; children?: ReactNode; action?: ReactNode }) {
  return (
    <div role="alert" className="error-box flex flex-wrap items-center gap-x-3 gap-y-1">
      <p className="max-w-[68ch]">
        <b className="text-madder">{what}</b> {children}
      </p>
      {action}
    </div>
  );
}

/** Rows that are on their way: their height is kept, dash bars stand where words will. */
export function LoadingRows({ rows = 6, label = 'Loading' }: { rows?: number; label?: string }) {
  return (
    <div role="status" aria-label={label} className="bg-sheet">
      {Array.from({ length: rows }, (_, i) => (
        <div key={i} className="flex h-[31px] items-center border-b border-feint px-3.5">
          <span className="dash-bar" style={{ width: `${38 + ((i * 37) % 41)}%` }} />
        </div>
      ))}
    </div>
  );
}

/** Ruled paper with the first step on its first line; every line of words stands between two rules. */
export function EmptyPaper({ title, children, action }: { title: string; children?: ReactNode; action?: ReactNode }) {
  return (
    <section className="ruled-paper min-h-full px-6 pt-12">
      <h2 className="font-serif text-[28px] leading-[48px] font-semibold">{title}</h2>
      {children && <div className="max-w-[68ch] font-serif text-[16px] leading-[48px] text-walnut2">{children}</div>}
      {action && <div className="flex min-h-12 items-center">{action}</div>}
    </section>
  );
}
