import { useSyncExternalStore } from 'react';
import { eventStream } from '#src/lib/events/stream.ts';
import { useStore } from '#src/lib/store/use-store.ts';

function subscribeToNetwork(listener: () => void): () => void {
  window.addEventListener('online', listener);
  window.addEventListener('offline', listener);
  return () => {
    window.removeEventListener('online', listener);
    window.removeEventListener('offline', listener);
  };
}

/** Why the server is out of reach, in a sentence; null while it can be reached. */
export function useConnection(): string | null {
  const isDown = useStore(eventStream().state) === 'down';
  const isOnline = useSyncExternalStore(subscribeToNetwork, () => navigator.onLine);
  if (!isOnline) return 'No network. Trying again.';
  return isDown ? 'Server not reached. Trying again.' : null;
}
