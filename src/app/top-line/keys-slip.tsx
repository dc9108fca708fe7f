import { lazy, Suspense, useRef, useState } from 'react';

/** Comes when the word is first pressed. */
const DrawnKeysSlip = lazy(async () => ({ default: (await import('./drawn-keys-slip.tsx')).DrawnKeysSlip }));

/** The word Keys, and the slip it opens under the top line. */
export function KeysSlip({ className }: { readonly className?: string }) {
  const [isOpen, setOpen] = useState(false);
  const word = useRef<HTMLButtonElement>(null);
  return (
    <>
      <button
        ref={word}
        type="button"
        aria-haspopup="dialog"
        aria-expanded={isOpen}
        className={className}
        onClick={() => setOpen(!isOpen)}
      >
        Keys
      </button>
      {isOpen && (
        <Suspense fallback={null}>
          <DrawnKeysSlip word={word} onClose={() => setOpen(false)} />
        </Suspense>
      )}
    </>
  );
}
