/** A note that wants to stand at a height. */
export interface WantedNote {
  readonly id: string;
  readonly top: number;
  readonly height: number;
}

const GAP = 20;
/** A note this near to its line is level with it. */
const LEVEL_WITHIN = 3;

/** Heights at which notes stand without covering one another: who comes later moves down. */
export function stackNotes(
  wanted: readonly WantedNote[],
): readonly { readonly id: string; readonly top: number; readonly isLevel: boolean }[] {
  let free = 0;
  return [...wanted]
    .sort((a, b) => a.top - b.top)
    .map(({ id, top, height }) => {
      const stands = Math.max(top, free);
      free = stands + height + GAP;
      return { id, top: stands, isLevel: stands - top <= LEVEL_WITHIN };
    });
}
