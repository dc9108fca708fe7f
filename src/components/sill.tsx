import { useEffect, type ReactNode } from 'react';
import { createStore } from '#src/lib/store/create-store.ts';
import { useStore } from '#src/lib/store/use-store.ts';
import { sillStore, type SillSentence as Sentence } from '#src/lib/sill-store.ts';
import { Word } from './word.tsx';

/** How many places on the screen show the sentence themselves; while there is one, the usual sill stays away. */
const places = createStore(0);

function SentenceText({ sentence }: { readonly sentence: Sentence }) {
  const { text, action } = sentence;
  return (
    <span
      className="text-sm text-ink"
      onPointerEnter={sillStore.hold}
      onPointerLeave={sillStore.release}
      onFocus={sillStore.hold}
      onBlur={sillStore.release}
    >
      {text}
      {action && (
        <Word
          className="ml-3"
          onClick={() => {
            sillStore.set(null);
            action.run();
          }}
        >
          {action.words}
        </Word>
      )}
    </span>
  );
}

/** What has just happened, for a screen that has its own bar at the foot. */
export function SillSentence() {
  const sentence = useStore(sillStore);
  useEffect(() => {
    places.set(places.get() + 1);
    return () => places.set(places.get() - 1);
  }, []);
  return sentence && <SentenceText key={sentence.id} sentence={sentence} />;
}

/** The bar at the foot of a page, 48 px. */
export function SillBar({ children, label }: { readonly children: ReactNode; readonly label: string }) {
  return (
    <div
      role="region"
      aria-label={label}
      data-chrome
      data-region="sill"
      tabIndex={-1}
      className="fixed inset-x-0 bottom-0 z-[6] flex min-h-12 items-center gap-1 border-t border-rule bg-sill px-6 text-sm"
    >
      {children}
    </div>
  );
}

/** Stands at the foot only while there is a sentence to say and no screen says it itself. */
export function PassingSill() {
  const sentence = useStore(sillStore);
  const isSaidElsewhere = useStore(places) > 0;
  if (!sentence || isSaidElsewhere) return null;
  return (
    <SillBar label="What has happened">
      <span className="mx-auto">
        <SentenceText key={sentence.id} sentence={sentence} />
      </span>
    </SillBar>
  );
}

/** The one polite live region of the page. */
export function SillVoice() {
  const sentence = useStore(sillStore);
  return (
    <div role="status" aria-live="polite" className="sr-only">
      {sentence?.text}
    </div>
  );
}
