import { useEffect, useState } from 'react';
import { ProblemError, UnreachableError } from '../../lib/http.ts';
import type { PDFDocumentProxy } from 'pdfjs-dist';

/** After the last save, before the sheet is drawn anew. */
const SETTLE_MS = 350;

export interface PdfState {
  readonly pdf: PDFDocumentProxy | null;
  /** A newer one is on its way. */
  readonly isDrawing: boolean;
  /** Why there is none, in a sentence. */
  readonly trouble: string | null;
}

/** The library that draws PDF pages is fetched when the first sheet is looked at. */
async function openPdf(bytes: ArrayBuffer): Promise<PDFDocumentProxy> {
  const [pdfjs, { default: worker }] = await Promise.all([
    import('pdfjs-dist'),
    import('pdfjs-dist/build/pdf.worker.min.mjs?url'),
  ]);
  pdfjs.GlobalWorkerOptions.workerSrc = worker;
  return pdfjs.getDocument({ data: bytes }).promise;
}

async function fetchPdf(url: string, signal: AbortSignal): Promise<PDFDocumentProxy> {
  const response = await fetch(url, { credentials: 'same-origin', signal }).catch((cause: unknown) => {
    if (signal.aborted) throw cause;
    throw new UnreachableError('The server did not answer.', { cause });
  });
  if (!response.ok) throw new ProblemError((await response.json()) as ConstructorParameters<typeof ProblemError>[0]);
  return openPdf(await response.arrayBuffer());
}

/**
 * The real sheet, drawn by the server, as it is after the newest save. While a newer one is drawn the one before stays.
 * @param version changes with everything that a sheet shows
 */
export function usePdf(url: string, version: number): PdfState {
  const [state, setState] = useState<PdfState>({ pdf: null, isDrawing: true, trouble: null });
  useEffect(() => {
    const stop = new AbortController();
    const timer = setTimeout(() => {
      setState((before) => ({ ...before, isDrawing: true }));
      fetchPdf(url, stop.signal).then(
        (pdf) => {
          if (stop.signal.aborted) void pdf.destroy();
          else setState({ pdf, isDrawing: false, trouble: null });
        },
        (error: unknown) => {
          if (stop.signal.aborted) return;
          const trouble = error instanceof Error ? error.message : 'The sheet could not be drawn.';
          setState((before) => ({ ...before, isDrawing: false, trouble }));
        },
      );
    }, SETTLE_MS);
    return () => {
      clearTimeout(timer);
      stop.abort();
    };
  }, [url, version]);
  return state;
}
