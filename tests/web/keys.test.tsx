import { beforeEach, describe, expect, test, vi } from 'vitest';
import { useKeys, useSingleKeys } from '../../web/lib/use-keys.ts';
import { click, control, press, render } from './render.tsx';

function Page({ map }: { map: Record<string, () => void> }) {
  useKeys(map);
  const [on, set] = useSingleKeys();
  return (
    <>
      <textarea aria-label="Instruction" />
      <button type="button" onClick={() => set(!on)}>
        Single keys
      </button>
      <dialog open>
        <button type="button">Close</button>
      </dialog>
    </>
  );
}

const deeds = {
  M: vi.fn(),
  Space: vi.fn(),
  'Ctrl+Enter': vi.fn(),
  ArrowDown: vi.fn(),
  '?': vi.fn(),
  'Ctrl+Z': vi.fn(),
};

beforeEach(() => {
  localStorage.clear();
  vi.clearAllMocks();
});

describe('keys', () => {
  test('a key acts anywhere on the page, whatever its case, and the browser does nothing more with it', () => {
    render(<Page map={deeds} />);
    const event = press(document.body, 'm');
    press(document.body, '?', { shiftKey: true });
    expect(deeds.M).toHaveBeenCalledOnce();
    expect(deeds['?']).toHaveBeenCalledOnce();
    expect(event.defaultPrevented).toBe(true);
  });

  test('while somebody types, letters and Ctrl+Z are the field’s own; Ctrl+Enter still acts', () => {
    const { box } = render(<Page map={deeds} />);
    const field = control(box, 'Instruction');
    for (const key of ['m', ' ', 'ArrowDown']) press(field, key);
    press(field, 'z', { ctrlKey: true });
    expect(deeds.M).not.toHaveBeenCalled();
    expect(deeds.Space).not.toHaveBeenCalled();
    expect(deeds['Ctrl+Z']).not.toHaveBeenCalled();
    press(field, 'Enter', { ctrlKey: true });
    expect(deeds['Ctrl+Enter']).toHaveBeenCalledOnce();
  });

  test('Space presses the button that has the focus and never plays; arrows still walk', () => {
    const { box } = render(<Page map={deeds} />);
    const button = control(box, 'Single keys');
    press(button, ' ');
    press(button, 'ArrowDown');
    expect(deeds.Space).not.toHaveBeenCalled();
    expect(deeds.ArrowDown).toHaveBeenCalledOnce();
  });

  test('nothing acts behind a dialog', () => {
    const { box } = render(<Page map={deeds} />);
    press(control(box, 'Close'), 'm');
    expect(deeds.M).not.toHaveBeenCalled();
  });

  test('single keys can be switched off; keys with Ctrl go on', () => {
    const { box } = render(<Page map={deeds} />);
    click(control(box, 'Single keys'));
    press(document.body, 'm');
    press(document.body, 'Enter', { ctrlKey: true });
    expect(deeds.M).not.toHaveBeenCalled();
    expect(deeds['Ctrl+Enter']).toHaveBeenCalledOnce();
  });
});
