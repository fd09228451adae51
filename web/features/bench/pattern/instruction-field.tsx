import { type KeyboardEvent, useLayoutEffect, useRef } from 'react';
import { type LineCount } from '#crochet';
import { cx } from '../../../lib/class-names.ts';
import { MarkedText } from '../../../parts/marked-text.tsx';

/**
 * The instruction as it is typed, underlined to the letter where something is wrong. The same words lie twice over each
 * other: in a text area without ground, and under it, without colour, with the underlining; so caret, selection, spelling
 * and screen readers are the browser's own.
 */
export function InstructionField(props: {
  name: string;
  text: string;
  count: LineCount | undefined;
  describedBy: string;
  readOnly: boolean;
  big?: boolean;
  onType: (text: string) => void;
  onDone: () => void;
}) {
  const { name, text, count, describedBy, readOnly, big, onType, onDone } = props;
  const field = useRef<HTMLTextAreaElement>(null);
  useLayoutEffect(() => {
    const area = field.current;
    if (!area || big) return;
    area.focus({ preventScroll: true });
    area.setSelectionRange(area.value.length, area.value.length);
  }, [name, big]);

  const press = (event: KeyboardEvent<HTMLTextAreaElement>) => {
    if (event.nativeEvent.isComposing || event.ctrlKey || event.metaKey) return;
    if ((event.key === 'Enter' && !event.shiftKey) || event.key === 'Escape') {
      event.preventDefault();
      onDone();
    }
  };
  const face = cx(
    'wr col-start-1 row-start-1 px-[9px] py-[4px] break-words whitespace-pre-wrap',
    big && 'text-[18px]! leading-[26px]!',
  );
  return (
    <div className="relative grid rounded-2 border border-edge bg-field focus-within:border-woad focus-within:outline-2 focus-within:outline-offset-1 focus-within:outline-woad">
      <div aria-hidden className={cx(face, 'pointer-events-none min-h-8 text-transparent')}>
        <MarkedText text={text} count={count} />
        {'\u200b'}
      </div>
      <textarea
        ref={field}
        aria-label={`Instruction of ${name}`}
        aria-describedby={describedBy}
        aria-invalid={count?.verdict === 'unread' || count?.verdict === 'does-not-fit'}
        value={text}
        readOnly={readOnly}
        rows={1}
        spellCheck={false}
        autoCapitalize="off"
        autoComplete="off"
        placeholder="6 sc in magic ring"
        className={cx(face, 'size-full resize-none overflow-hidden bg-transparent outline-none')}
        onChange={(event) => onType(event.target.value.replaceAll('\n', ' '))}
        onKeyDown={press}
      />
    </div>
  );
}
