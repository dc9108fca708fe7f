import { lazy, Suspense, type ReactNode } from 'react';

/** Comes when a sheet is first opened: most screens never open one. */
const DrawnSheet = lazy(async () => ({ default: (await import('./drawn-sheet.tsx')).DrawnSheet }));

export interface SheetProps {
  readonly open: boolean;
  readonly onClose: () => void;
  readonly title: string;
  /** The title is for screen readers alone. */
  readonly isTitleHidden?: boolean;
  readonly children: ReactNode;
}

/** From the bottom of a small screen: the stations, a provenance card. */
export function Sheet({ open, ...drawn }: SheetProps) {
  if (!open) return null;
  return (
    <Suspense fallback={null}>
      <DrawnSheet {...drawn} />
    </Suspense>
  );
}
