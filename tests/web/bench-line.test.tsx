import { describe, expect, test, vi } from 'vitest';
import { countPattern, type LineCount } from '../../api/crochet/index.ts';
import { nextToLook, pieceStitches, tallyVerdicts } from '../../web/features/bench/desk/bench-count.ts';
import { knotLabel, lineName, nextNumber, spokenName } from '../../web/features/bench/desk/line-name.ts';
import { heardSpan, loopSpan } from '../../web/features/bench/desk/moments.ts';
import { InstructionField } from '../../web/features/bench/pattern/instruction-field.tsx';
import { spokenLine } from '../../web/features/bench/pattern/line-figures.ts';
import { markParts } from '../../web/parts/marked-text.tsx';
import { workedFigure } from '../../web/parts/worked-figure.ts';
import { TotalField } from '../../web/features/bench/pattern/total-field.tsx';
import { control, press, render } from './render.tsx';
import { act } from 'react';

const line = (n: number, text: string, more: object = {}) => ({
  id: `r${n}`,
  shortId: `s${n}`,
  pieceId: 'body',
  orderKey: `a${n}`,
  kind: 'round' as const,
  label: '',
  from: n,
  to: n,
  text,
  note: '',
  written: null,
  said: null,
  heardTotal: null,
  filmed: true,
  putAsideReason: null,
  spokenSlip: null,
  version: 1,
  ...more,
});
const LINES = [
  line(1, '6 sc in magic ring', { written: { sts: [6] } }),
  line(2, 'inc ×6', { written: { sts: [12] } }),
  line(3, '(sc, inc) ×6', { written: { sts: [19] } }),
  line(4, '(3 sc, dec) ×6', { written: { sts: [24] } }),
  line(5, 'sc around, then something unheard of in each', { said: { sts: [24] } }),
];
const counted = countPattern({
  terms: 'US',
  sizes: [],
  pieces: [{ id: 'body', name: 'Body', make: 1, worked: 'spiral', lines: LINES }],
});
const counts = new Map(counted.pieces[0]!.lines.map((one): [string, LineCount] => [one.id, one]));

describe('a line on the bench', () => {
  test('is named as the trade names it', () => {
    expect(lineName(line(9, ''))).toBe('R9');
    expect(lineName(line(5, '', { to: 8 }))).toBe('R5–8');
    expect(lineName(line(5, '', { to: null }))).toBe('R5 on');
    expect(knotLabel(line(5, '', { to: 8 }))).toBe('5–8');
    expect(spokenName(line(5, '', { to: 8, kind: 'row' }))).toBe('rows 5 to 8');
    expect(nextNumber(line(5, '', { to: 8 }))).toBe(9);
    expect(nextNumber(undefined)).toBe(1);
  });

  test('shows what it would need where it does not fit', () => {
    expect(workedFigure(counts.get('r2'))).toEqual({ text: ['12'], isOdd: false });
    expect(workedFigure(counts.get('r4'))).toEqual({ text: ['needs 30'], isOdd: true });
  });

  test('is read out with its totals and its verdict in words', () => {
    expect(spokenLine(LINES[1]!, counts.get('r2'), undefined)).toBe(
      'round 2, inc times 6, written 12, worked out 12, agrees',
    );
  });

  test('is underlined to the letter, and never beyond what is typed', () => {
    expect(markParts('2 sc, and so on', [{ start: 6, end: 15 }], null)).toEqual([
      { text: '2 sc, ', mark: null },
      { text: 'and so on', mark: 'tack' },
    ]);
    expect(markParts('2 sc', [{ start: 6, end: 15 }], null)).toEqual([{ text: '2 sc', mark: null }]);
    expect(markParts('(3 sc, dec)', [], { start: 7, end: 10 }).map((part) => part.mark)).toEqual([null, 'fault', null]);
  });
});

describe('the list', () => {
  test('counts its verdicts, worst first', () => {
    expect(tallyVerdicts(LINES, counts).map((one) => one.verdict)).toEqual([
      'unread',
      'does-not-fit',
      'differs',
      'agrees',
    ]);
  });

  test('is walked from fault to fault, worst first, and round again', () => {
    const walked = [nextToLook(LINES, counts, null)];
    for (let i = 0; i < 3; i += 1) walked.push(nextToLook(LINES, counts, walked.at(-1)!));
    expect(walked).toEqual(['r5', 'r4', 'r3', 'r5']);
  });

  test('sums its stitches, every round of a range', () => {
    expect(pieceStitches(LINES.slice(0, 2), counts)).toBe(18);
    expect(pieceStitches([], counts)).toBeNull();
  });
});

describe('a moment', () => {
  const mark = (id: string, startMs: number) => ({
    id,
    lineId: id,
    recordingId: 'a',
    startMs,
    endMs: null,
    main: true,
    title: null,
    madeBy: 'person' as const,
    version: 1,
  });
  const moments = [mark('r1', 1000), mark('r2', 9000)];

  test('loops to the next one, the last to the end', () => {
    expect(loopSpan(moments[0], moments, 60_000)).toEqual({ startMs: 1000, endMs: 9000 });
    expect(loopSpan(moments[1], moments, 60_000)).toEqual({ startMs: 9000, endMs: 60_000 });
  });

  test('is heard to the end of the words that speak of it', () => {
    const evidence = [
      {
        id: 'e',
        lineId: 'r1',
        transcriptId: 't',
        role: 'work' as const,
        firstWord: 0,
        lastWord: 1,
        startMs: 1000,
        endMs: 4200,
        words: '',
      },
    ];
    expect(heardSpan(moments[0], evidence, moments, 60_000)).toEqual({ startMs: 1000, endMs: 4200 });
    expect(heardSpan(undefined, evidence, moments, 60_000)).toBeNull();
  });
});

describe('fields', () => {
  const type = (field: HTMLElement, value: string) =>
    act(() => {
      const proto = field instanceof HTMLTextAreaElement ? HTMLTextAreaElement.prototype : HTMLInputElement.prototype;
      Object.getOwnPropertyDescriptor(proto, 'value')!.set!.call(field, value);
      field.dispatchEvent(new Event('input', { bubbles: true }));
    });

  test('Enter is done with the line, Shift+Enter and a composing Enter are not', () => {
    const onDone = vi.fn();
    const { box } = render(
      <InstructionField
        name="R9"
        text="inc"
        count={undefined}
        describedBy="x"
        readOnly={false}
        onType={vi.fn()}
        onDone={onDone}
      />,
    );
    const field = control(box, 'Instruction of R9');
    press(field, 'Enter', { shiftKey: true });
    press(field, 'Enter', { isComposing: true });
    press(field, 'Enter', { ctrlKey: true });
    expect(onDone).not.toHaveBeenCalled();
    press(field, 'Enter');
    expect(onDone).toHaveBeenCalledOnce();
  });

  test('a pasted line break does not break the instruction', () => {
    const onType = vi.fn();
    const { box } = render(
      <InstructionField
        name="R9"
        text=""
        count={undefined}
        describedBy="x"
        readOnly={false}
        onType={onType}
        onDone={vi.fn()}
      />,
    );
    type(control(box, 'Instruction of R9'), '2 sc,\ninc');
    expect(onType).toHaveBeenCalledWith('2 sc, inc');
  });

  test('a total that is no count is said so, and the line keeps what it had', () => {
    const onChange = vi.fn();
    const { box } = render(
      <TotalField
        name="R9"
        voice="written"
        totals={{ sts: [18] }}
        isOdd={false}
        readOnly={false}
        onChange={onChange}
      />,
    );
    type(control(box, 'Total written, R9'), 'about twenty');
    expect(onChange).not.toHaveBeenCalled();
    expect(box.querySelector('[role=alert]')?.textContent).toContain('Not a count');
    type(control(box, 'Total written, R9'), '24');
    expect(onChange).toHaveBeenLastCalledWith({ sts: [24] });
    type(control(box, 'Total written, R9'), '');
    expect(onChange).toHaveBeenLastCalledWith(null);
  });
});
