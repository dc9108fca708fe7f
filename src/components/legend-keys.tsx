import { SentenceText } from './sentence-text.tsx';

/** How measured things are drawn, everywhere. */
export function MeasuredKey({ words = 'measured' }: { readonly words?: string }) {
  return (
    <span className="inline-flex items-center gap-[7px] whitespace-nowrap text-water">
      <svg width="22" height="14" viewBox="0 0 22 14" aria-hidden="true">
        <path d="M11 1v12M8.5 1h5M8.5 13h5" stroke="currentColor" strokeWidth="1.3" />
        <circle cx="11" cy="7" r="3.4" fill="currentColor" />
      </svg>
      <span>
        <SentenceText text={words} />
      </span>
    </span>
  );
}

export function PredictedKey({ words = 'predicted' }: { readonly words?: string }) {
  return (
    <span className="inline-flex items-center gap-[7px] whitespace-nowrap text-copper">
      <svg width="22" height="14" viewBox="0 0 22 14" aria-hidden="true">
        <path d="M0 2.5C8 2 14 4 22 6v7C14 11 8 9 0 9.5z" fill="currentColor" opacity=".2" />
        <path d="M0 6c8-.5 14 1.5 22 3.5" stroke="currentColor" strokeWidth="2" fill="none" />
      </svg>
      <span>
        <SentenceText text={words} />
      </span>
    </span>
  );
}

export function DisagreementKey({ words = 'disagreement' }: { readonly words?: string }) {
  return (
    <span className="inline-flex items-center gap-[7px] whitespace-nowrap text-leak">
      <svg width="22" height="14" viewBox="0 0 22 14" aria-hidden="true">
        <path d="M0 3h22" stroke="currentColor" strokeWidth="1" strokeDasharray="2 2" />
        <path d="M5 3v8M11 3v5M17 3v9" stroke="currentColor" strokeWidth="1.8" />
      </svg>
      <span>
        <SentenceText text={words} />
      </span>
    </span>
  );
}
