/** One word of the station line. */
export interface StationWord {
  readonly to: string;
  readonly words: string;
  readonly isHere: boolean;
  /** The count in its cup; only where we are. */
  readonly cup: string | null;
}
