import { useEffect } from 'react';
import { setSession, useSession } from '../../state/session.ts';

/** A short word that goes by itself. */
export function Toast() {
  const toast = useSession((state) => state.toast);
  useEffect(() => {
    if (toast === null) return;
    const timer = setTimeout(() => setSession({ toast: null }), 4000);
    return () => clearTimeout(timer);
  }, [toast]);
  return (
    <div role="status" className={toast === null ? 'spoken' : 'toast'}>
      {toast}
    </div>
  );
}
