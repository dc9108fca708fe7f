import type { RefObject } from 'react';
import { Vessel } from '#src/components/vessel.tsx';
import { useSectionPlaces, type SectionPlace } from './use-section-places.ts';

/** What a section's vessel says. */
export interface VesselledSection {
  readonly section: string;
  /** How full it is, 0 to 1, and the same in a word. */
  readonly share: number;
  readonly words: string;
  /** Who is in it. */
  readonly people?: readonly string[];
}

interface SectionVesselsProps {
  readonly page: RefObject<HTMLElement | null>;
  readonly sections: readonly VesselledSection[];
  /** Height of what covers the foot of the view: the sill, or a channel. */
  readonly foot?: number;
}

const SILL = 48;

/** Each section's vessel at the page's left edge; sections out of view wait as short named ones at the edges. */
export function SectionVessels({ page, sections, foot = SILL }: SectionVesselsProps) {
  const places = useSectionPlaces(page, sections.length, foot);
  const waiting = (where: SectionPlace['where']) =>
    sections.flatMap((section, index) =>
      places[index]?.where === where ? [{ section, number: index + 1 }] : [],
    );
  return (
    <>
      {sections.map(({ section, share, words, people = [] }, index) => {
        const place = places[index];
        if (place?.where !== 'in view') return null;
        return (
          <div key={section} className="section-vessel" style={{ top: place.top, height: place.height }}>
            <span className="text-right text-xs text-ink-2">
              {words}
              {people.length > 0 && <span className="mt-1 block text-2xs">{people.join(', ')}</span>}
            </span>
            <Vessel share={share} height={place.height} />
          </div>
        );
      })}
      <WaitingSections label="Sections above" side="above" sections={waiting('above')} />
      <WaitingSections label="Sections below" side="below" sections={waiting('below')} foot={foot} />
    </>
  );
}

interface WaitingSectionsProps {
  readonly label: string;
  readonly side: 'above' | 'below';
  readonly sections: readonly { readonly section: VesselledSection; readonly number: number }[];
  readonly foot?: number;
}

function WaitingSections({ label, side, sections, foot }: WaitingSectionsProps) {
  if (sections.length === 0) return null;
  return (
    <nav
      aria-label={label}
      className={`waiting-sections waiting-sections-${side}`}
      style={foot === undefined ? undefined : { bottom: foot + 4 }}
    >
      {sections.map(({ section, number }) => (
        <a
          key={number}
          href={`#${number}`}
          onClick={(event) => {
            event.preventDefault();
            document.getElementById(String(number))?.scrollIntoView({ block: 'start' });
          }}
        >
          {section.section}
          <Vessel share={section.share} height={24} />
        </a>
      ))}
    </nav>
  );
}
