import { lazy, Suspense, type CSSProperties } from 'react';
import type { ProvenanceBodyProps } from './provenance-body.tsx';

/** Comes when the first number is pressed. */
const DrawnProvenanceCard = lazy(async () => ({
  default: (await import('./drawn-provenance-card.tsx')).DrawnProvenanceCard,
}));

export interface ProvenanceCardProps extends ProvenanceBodyProps {
  readonly onClose: () => void;
  /** Where the card stands in its positioned parent; on a narrow screen it is a sheet from below. */
  readonly place: CSSProperties;
  /** Side on which the notch points at the number; none without a side. */
  readonly notch?: 'left' | 'right' | undefined;
  /** True when it was opened by a key, so that the focus goes into it. */
  readonly takesFocus?: boolean;
  readonly onPointerEnter?: () => void;
  readonly onPointerLeave?: () => void;
}

/** Where a number comes from, beside it. Escape closes it; whoever opened it takes the focus back. */
export function ProvenanceCard(props: ProvenanceCardProps) {
  return (
    <Suspense fallback={null}>
      <DrawnProvenanceCard {...props} />
    </Suspense>
  );
}
