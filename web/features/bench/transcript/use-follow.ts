import { type RefObject, useEffect, useRef, useState } from 'react';

/**
 * Keeps the spoken caption in sight: the list is scrolled only when the caption leaves the middle third, and no more once
 * somebody has scrolled by hand, until `follow` is called.
 */
export function useFollow(list: RefObject<HTMLElement | null>, captionId: string | null) {
  const [isFollowing, setFollowing] = useState(true);
  const isOurs = useRef(false);

  useEffect(() => {
    if (isFollowing) isOurs.current = bringToMiddle(list.current, captionId) || isOurs.current;
  }, [isFollowing, list, captionId]);

  const onScroll = () => {
    if (isOurs.current) isOurs.current = false;
    else setFollowing(false);
  };
  return { isFollowing, follow: () => setFollowing(true), onScroll };
}

/** @returns whether it had to scroll */
function bringToMiddle(box: HTMLElement | null, captionId: string | null): boolean {
  const row = captionId === null ? null : box?.querySelector<HTMLElement>(`[data-caption="${captionId}"]`);
  if (!box || !row) return false;
  const third = box.clientHeight / 3;
  const top = row.offsetTop - box.scrollTop;
  if (top >= third && top + row.offsetHeight <= 2 * third) return false;
  const before = box.scrollTop;
  box.scrollTo({ top: row.offsetTop - third });
  return box.scrollTop !== before;
}
