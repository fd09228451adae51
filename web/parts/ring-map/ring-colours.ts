import type { RingState } from '#crochet/shape';

/** What a ring or a row is drawn in; its shape says the same. */
export const RING_COLOURS: Record<RingState, string> = {
  done: 'var(--color-woad)',
  now: 'var(--color-now)',
  'to-come': 'var(--color-tocome)',
  differs: 'var(--color-madder)',
  'does-not-fit': 'var(--color-madder)',
  unread: 'var(--color-unreadring)',
};
