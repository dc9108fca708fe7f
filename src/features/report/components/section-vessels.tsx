import { useEffect, useState, type RefObject } from 'react';
import type { LevelledSection } from '#shared/report/levels.ts';
import { Vessel } from '#src/components/vessel.tsx';
import { levelShare } from '#src/components/level.ts';
import { useHere } from '#src/lib/events/use-where.ts';
import { firstName } from '#src/lib/say/last-name.ts';

interface Place {
  readonly top: number;
  readonly height: number;
  /** Where it is against the view. */
  readonly where: 'above' | 'in view' | 'below';
}

/** Each section's vessel at the page's left edge; sections out of view wait as short named ones at the edges. */
export function SectionVessels({
  page,
  sections,
}: {
  readonly page: RefObject<HTMLElement | null>;
  readonly sections: readonly LevelledSection[];
}) {
  const places = usePlaces(page, sections.length);
  const here = useHere();
  const waiting = (where: Place['where']) =>
    sections.flatMap((section, index) =>
      places[index]?.where === where ? [{ section, number: index + 1 }] : [],
    );
  return (
    <>
      {sections.map((section, index) => {
        const place = places[index];
        if (place?.where !== 'in view') return null;
        const people = here
          .filter(({ where }) => where === section.section)
          .map(({ name }) => firstName(name));
        return (
          <div
            key={section.section}
            className="section-vessel"
            style={{ top: place.top, height: place.height }}
          >
            <span className="text-right text-xs text-ink-2">
              {section.level}
              {people.length > 0 && <span className="mt-1 block text-2xs">{people.join(', ')}</span>}
            </span>
            <Vessel share={levelShare(section.level)} height={place.height} />
          </div>
        );
      })}
      <WaitingSections label="Sections above" side="above" sections={waiting('above')} />
      <WaitingSections label="Sections below" side="below" sections={waiting('below')} />
    </>
  );
}

function WaitingSections({
  label,
  side,
  sections,
}: {
  readonly label: string;
  readonly side: 'above' | 'below';
  readonly sections: readonly { readonly section: LevelledSection; readonly number: number }[];
}) {
  if (sections.length === 0) return null;
  return (
    <nav aria-label={label} className={`waiting-sections waiting-sections-${side}`}>
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
          <Vessel share={levelShare(section.level)} height={24} />
        </a>
      ))}
    </nav>
  );
}

const TOP_LINE = 84;
const SILL = 48;

function usePlaces(page: RefObject<HTMLElement | null>, count: number): readonly Place[] {
  const [places, setPlaces] = useState<readonly Place[]>([]);
  useEffect(() => {
    const frame = page.current;
    if (!frame) return undefined;
    let waiting = 0;
    const measure = () => {
      waiting = 0;
      setPlaces(measured(frame));
    };
    const soon = () => {
      if (waiting === 0) waiting = requestAnimationFrame(measure);
    };
    const observer = new ResizeObserver(soon);
    observer.observe(frame);
    window.addEventListener('scroll', soon, { passive: true });
    window.addEventListener('resize', soon);
    soon();
    return () => {
      cancelAnimationFrame(waiting);
      observer.disconnect();
      window.removeEventListener('scroll', soon);
      window.removeEventListener('resize', soon);
    };
  }, [page, count]);
  return places;
}

function measured(frame: HTMLElement): Place[] {
  const origin = frame.getBoundingClientRect().top;
  const foot = window.innerHeight - SILL;
  return [...frame.querySelectorAll('.report-section')].map((section) => {
    const { top, bottom } = section.getBoundingClientRect();
    const where = bottom < TOP_LINE + 40 ? 'above' : top > foot - 40 ? 'below' : 'in view';
    const from = Math.max(top + 6, TOP_LINE);
    const to = Math.min(bottom - 4, foot - 12);
    return { where, top: from - origin, height: Math.max(24, to - from) };
  });
}
