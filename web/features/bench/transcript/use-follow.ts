import { type RefObject, useEffect, useState } from 'react';

const SCROLL_KEYS = new Set(['ArrowUp', 'ArrowDown', 'PageUp', 'PageDown', 'Home', 'End', ' ']);

/**
 * Keeps the spoken caption in sight: the list is scrolled only when the caption leaves the middle third, and no more once
 * somebody has scrolled by hand, until `follow` is called. `byHand` goes on the list: it listens to hands, not to scrolling,
 * which also happens by itself.
 */
export function useFollow(list: RefObject<HTMLElement | null>, captionId: string | null) {
  const [isFollowing, setFollowing] = useState(true);
  useEffect(() => {
    if (isFollowing) bringToMiddle(list.current, captionId);
  }, [isFollowing, list, captionId]);

  const stop = () => setFollowing(false);
  const byHand = {
    onWheel: stop,
    onTouchMove: stop,
    onPointerDown: (event: React.PointerEvent) => event.target === event.currentTarget && stop(),
    onKeyDown: (event: React.KeyboardEvent) =>
      event.target === event.currentTarget && SCROLL_KEYS.has(event.key) && stop(),
  };
  return { isFollowing, follow: () => setFollowing(true), byHand };
}

function bringToMiddle(box: HTMLElement | null, captionId: string | null): void {
  const row = captionId === null ? null : box?.querySelector<HTMLElement>(`[data-caption="${captionId}"]`);
  if (!box || !row) return;
  const third = box.clientHeight / 3;
  const top = row.offsetTop - box.scrollTop;
  if (top < third || top + row.offsetHeight > 2 * third) box.scrollTo({ top: row.offsetTop - third });
}
