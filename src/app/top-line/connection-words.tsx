import { useSyncExternalStore, type ReactNode } from 'react';
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

/** Why the server is out of reach, in words; otherwise what stands here usually. */
export function ConnectionWords({ children }: { readonly children: ReactNode }) {
  const isDown = useStore(eventStream().state) === 'down';
  const isOnline = useSyncExternalStore(subscribeToNetwork, () => navigator.onLine);
  const words = !isOnline ? 'No network.' : 'Server not reached.';
  return (
    <span role="status">
      {isDown || !isOnline ? <span className="late text-ink">{words} Trying again.</span> : children}
    </span>
  );
}
