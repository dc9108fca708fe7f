import './provenance.css';
import { useEffect, useRef } from 'react';
import { provenanceOf } from '#shared/report/provenance.ts';
import { Sheet } from '#src/components/sheet.tsx';
import { classNames } from '#src/lib/class-names.ts';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';
import { useMedia } from '#src/lib/use-media.ts';
import { ProvenanceBody } from './provenance-body.tsx';
import type { ProvenanceCardProps } from './provenance-card.tsx';

/** The width from which there is a margin to stand in. */
const ROOM = '(min-width: 1100px)';

/** What a provenance card draws once it is open. */
export function DrawnProvenanceCard({
  onClose,
  place,
  notch,
  takesFocus = false,
  onPointerEnter,
  onPointerLeave,
  ...body
}: ProvenanceCardProps) {
  const hasRoom = useMedia(ROOM);
  const card = useRef<HTMLElement>(null);
  const { evidence, findings } = useFindingsSnapshot();
  const { shown } = provenanceOf(body.reference, evidence, findings, body.unit ?? null);
  const title = `Where ${shown.value} comes from`;
  useEffect(() => {
    if (hasRoom && takesFocus) card.current?.focus({ preventScroll: true });
  }, [hasRoom, takesFocus, body.reference]);
  useEscape(hasRoom, onClose);
  if (!hasRoom) {
    return (
      <Sheet open onClose={onClose} title={title} isTitleHidden>
        <ProvenanceBody {...body} />
      </Sheet>
    );
  }
  return (
    <aside
      ref={card}
      role="dialog"
      aria-label={title}
      tabIndex={-1}
      data-region="margin"
      data-region-start
      style={place}
      onPointerEnter={onPointerEnter}
      onPointerLeave={onPointerLeave}
      className={classNames(
        'rises absolute z-[5] w-[372px] rounded-sm bg-paper px-5 pt-4 pb-3.5 shadow-card outline-offset-0',
        notch === 'left' && 'card-notch-left',
        notch === 'right' && 'card-notch-right',
      )}
    >
      <ProvenanceBody {...body} />
    </aside>
  );
}

function useEscape(isOn: boolean, onClose: () => void): void {
  useEffect(() => {
    if (!isOn) return undefined;
    const onKey = (event: KeyboardEvent) => {
      if (event.key !== 'Escape' || event.defaultPrevented) return;
      event.preventDefault();
      onClose();
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, [isOn, onClose]);
}
