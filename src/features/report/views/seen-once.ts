const waiting = new WeakMap<Element, () => void>();
let observer: IntersectionObserver | null = null;

/** Calls back once the element is about to come into view; one observer for all. Gives a way to forget it. */
export function seenOnce(element: Element, onSeen: () => void): () => void {
  observer ??= new IntersectionObserver(
    (entries) => {
      for (const { isIntersecting, target } of entries) {
        if (!isIntersecting) continue;
        observer?.unobserve(target);
        waiting.get(target)?.();
        waiting.delete(target);
      }
    },
    { rootMargin: '600px' },
  );
  waiting.set(element, onSeen);
  observer.observe(element);
  return () => {
    observer?.unobserve(element);
    waiting.delete(element);
  };
}
