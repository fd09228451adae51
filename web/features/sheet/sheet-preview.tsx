import { Download } from 'lucide-react';
import { useEffect, useRef, useState } from 'react';
import type { PDFDocumentProxy } from 'pdfjs-dist';
import type { Paper } from '#contract/editions';
import { ErrorNote } from '../../ui/notes.tsx';
import { Icon } from '../../ui/icon.tsx';
import { Switch } from '../../ui/switch.tsx';
import { usePdf } from './use-pdf.ts';

const PAPERS = [
  { value: 'A4', label: 'A4' },
  { value: 'Letter', label: 'Letter' },
] as const;
const TERMS = [
  { value: 'US', label: 'US terms' },
  { value: 'UK', label: 'UK terms' },
] as const;

/** The sheet as it prints, page under page, with the choice of paper and terms and the way to download it. */
export function SheetPreview({
  patternId,
  version,
  paper: own,
  terms: ownTerms,
}: {
  patternId: string;
  version: number;
  paper: Paper;
  terms: 'US' | 'UK';
}) {
  const [paper, setPaper] = useState<Paper>(own);
  const [terms, setTerms] = useState(ownTerms);
  const url = `/api/patterns/${patternId}/sheet.pdf?paper=${paper}&terms=${terms}`;
  const { pdf, isDrawing, trouble } = usePdf(url, version);
  return (
    <section
      aria-labelledby="sheet-preview"
      // It scrolls by itself beside the forms, so it must be reached by keyboard too.
      tabIndex={0}
      className="min-w-0 lg:sticky lg:top-[52px] lg:max-h-[calc(100dvh-52px)] lg:self-start lg:overflow-y-auto"
    >
      <div className="panel-head flex-wrap gap-3 py-1.5">
        <h2 id="sheet-preview" className="h-panel">
          As it prints
        </h2>
        <span role="status" className="text-walnut2">
          {isDrawing ? 'Drawing' : pdf ? `${pdf.numPages} ${pdf.numPages === 1 ? 'page' : 'pages'}` : ''}
        </span>
        <span className="grow" />
        <Switch label="Paper" value={paper} options={PAPERS} onChange={setPaper} />
        <Switch label="Terms" value={terms} options={TERMS} onChange={setTerms} />
        <a className="btn" href={url} download>
          <Icon of={Download} size={17} />
          Download
        </a>
      </div>
      {trouble !== null && (
        <div className="p-3.5">
          <ErrorNote what="The sheet could not be drawn.">{trouble} What you typed is kept.</ErrorNote>
        </div>
      )}
      <div className="grid justify-items-center gap-4 p-4 max-sm:p-2">
        {pdf && Array.from({ length: pdf.numPages }, (_, i) => <Page key={i} pdf={pdf} number={i + 1} />)}
      </div>
    </section>
  );
}

/** One page, drawn as sharp as the screen is. */
function Page({ pdf, number }: { pdf: PDFDocumentProxy; number: number }) {
  const canvas = useRef<HTMLCanvasElement>(null);
  useEffect(() => {
    let stop: (() => void) | null = null;
    let isGone = false;
    void pdf.getPage(number).then((page) => {
      const target = canvas.current;
      if (!target || isGone) return;
      const whole = page.getViewport({ scale: 1 });
      const viewport = page.getViewport({
        scale: Math.min(2.4, (target.clientWidth * devicePixelRatio) / whole.width),
      });
      target.width = viewport.width;
      target.height = viewport.height;
      const task = page.render({ canvas: target, viewport });
      stop = () => task.cancel();
      // A newer sheet takes the place of one that is still being drawn.
      task.promise.catch(() => undefined);
    });
    return () => {
      isGone = true;
      stop?.();
    };
  }, [pdf, number]);
  return (
    <canvas
      ref={canvas}
      role="img"
      aria-label={`Page ${number} of ${pdf.numPages} of the sheet`}
      className="w-full max-w-[794px] border border-rule bg-white"
    />
  );
}
