import { useCallback, useEffect, useState } from 'react';
import { onSessionEnded } from '#src/lib/api/session-token.ts';

/** Whether the server has refused something because the session ran out. */
export function useSessionEnded(): { has: boolean; forget: () => void } {
  const [has, setHas] = useState(false);
  useEffect(() => onSessionEnded(() => setHas(true)), []);
  return { has, forget: useCallback(() => setHas(false), []) };
}
