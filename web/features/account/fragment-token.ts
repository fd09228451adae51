import { useState } from 'react';
import { useLocation } from 'react-router-dom';

/** The token of a letter's link. It stands behind the #, so that no server's log holds it. */
export function useFragmentToken(): string {
  const { hash } = useLocation();
  const [token] = useState(hash.slice(1));
  return token;
}
