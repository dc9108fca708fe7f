import type { Ref } from 'react';
import type { Hue } from '#shared/evidence/findings.ts';
import { classNames } from '#src/lib/class-names.ts';

/** fresh; moved since it was last read; typed and not tied; its source is gone. */
export type LiveValueState = 'fresh' | 'moved' | 'untied' | 'gone';

export function liveValueClass(hue: Hue, state: LiveValueState, isOpen: boolean): string {
  const form = state === 'untied' || state === 'gone' ? `lv-${state}` : `lv-${hue}`;
  return classNames('lv', form, isOpen && 'lv-open');
}

interface LiveValueTextProps {
  readonly hue: Hue;
  readonly text: string;
  /** "46.4 plus or minus 0.4 centimetres, measured, 3 trials" */
  readonly spoken: string;
  readonly state?: LiveValueState;
  /** The text it had when it was last read, struck, while `state` is moved. */
  readonly before?: string | undefined;
  readonly isOpen?: boolean;
  readonly onOpen?: (() => void) | undefined;
  readonly ref?: Ref<HTMLButtonElement>;
}

/** A number that opens its provenance. */
export function LiveValueText({
  hue,
  text,
  spoken,
  state = 'fresh',
  before,
  isOpen = false,
  onOpen,
  ref,
}: LiveValueTextProps) {
  return (
    <>
      {state === 'moved' && before !== undefined && <del className="lv-moved mr-1">{before}</del>}
      <button
        ref={ref}
        type="button"
        aria-label={spoken}
        aria-haspopup="dialog"
        aria-expanded={isOpen}
        onClick={onOpen}
        className={liveValueClass(hue, state, isOpen)}
      >
        {text}
      </button>
    </>
  );
}
