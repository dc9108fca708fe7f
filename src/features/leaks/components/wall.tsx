import { Fragment } from 'react';
import type { WallStretch } from '../view/leak-rows.ts';

/** The report as a vessel, as tall as its questions, its sections marked on the wall. */
export function Wall({ wall, rows }: { readonly wall: readonly WallStretch[]; readonly rows: number }) {
  return (
    <>
      <div
        aria-hidden="true"
        style={{ gridRow: `1 / ${rows + 1}` }}
        className="relative col-start-2 -mt-6 rounded-b-2xl border-x-[2.2px] border-b-[2.2px] border-ink"
      >
        <div className="absolute inset-x-0 top-5 bottom-0 rounded-b-[13px] border-t-[2.5px] border-water">
          <div className="h-full rounded-b-[13px] bg-water-fill opacity-60" />
        </div>
      </div>
      {wall.map(({ section, from, to }) => (
        <Fragment key={section}>
          <div
            aria-hidden="true"
            style={{ gridRow: `${from} / ${to}` }}
            className="col-start-1 flex items-center justify-center text-sm font-medium text-ink-2 [writing-mode:sideways-lr] max-sm:hidden"
          >
            {section}
          </div>
          {to <= rows && (
            <div
              aria-hidden="true"
              style={{ gridRow: to }}
              className="z-[1] col-start-2 h-0 w-5 border-t-[1.5px] border-ink max-sm:w-2"
            />
          )}
        </Fragment>
      ))}
    </>
  );
}
