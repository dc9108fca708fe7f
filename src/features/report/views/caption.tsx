import { useState } from 'react';

/** The line below a figure, table or plate; written in its own place. */
export function Caption({
  kind,
  number,
  text,
  isEditable,
  onKeep,
}: {
  readonly kind: string;
  readonly number: number | undefined;
  readonly text: string;
  readonly isEditable: boolean;
  readonly onKeep: (text: string) => void;
}) {
  const [typed, setTyped] = useState<string | null>(null);
  const label = `${kind} ${number ?? ''}`.trim();
  return (
    <figcaption className="report-caption" contentEditable={false}>
      <b>{label}.</b>{' '}
      {isEditable ? (
        <input
          className="report-caption-field"
          aria-label={`Caption of ${label}`}
          placeholder="what it shows"
          maxLength={600}
          value={typed ?? text}
          onChange={(event) => setTyped(event.target.value)}
          onBlur={() => {
            if (typed !== null && typed !== text) onKeep(typed);
            setTyped(null);
          }}
          onKeyDown={(event) => {
            event.stopPropagation();
            if (event.key === 'Enter' || event.key === 'Escape') event.currentTarget.blur();
          }}
        />
      ) : (
        text
      )}
    </figcaption>
  );
}
