import type { ReactNode } from 'react';
import { useConnection } from './use-connection.ts';

/** That the server is out of reach; otherwise what stands here usually. */
export function ConnectionWords({ children }: { readonly children: ReactNode }) {
  const sentence = useConnection();
  return (
    <span role="status">
      {sentence === null ? children : <span className="late text-ink">{sentence}</span>}
    </span>
  );
}

/** The same on a phone, where the top line has no room: under it, and only when there is something to say. */
export function PhoneConnection() {
  const sentence = useConnection();
  return (
    <div role="status" className="sm:hidden">
      {sentence !== null && (
        <p className="late border-b border-rule bg-sill py-1.5 pr-32 pl-4.5 text-xs">{sentence}</p>
      )}
    </div>
  );
}
