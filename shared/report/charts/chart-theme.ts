/**
 * Colours and faces that a chart is drawn with. The screen reads them from its CSS properties, and again when the
 * theme changes; the PDF always passes the light ones.
 */
export interface ChartTheme {
  /** Colours as CSS hexadecimal, `#rrggbb`. */
  readonly ink: string;
  readonly ink2: string;
  readonly ink3: string;
  readonly paper: string;
  readonly hair: string;
  /** Measured. */
  readonly water: string;
  /** Predicted. */
  readonly copper: string;
  /** Disagreement. */
  readonly leak: string;
  /** CSS font families: figures and words, and the symbols of quantities. */
  readonly uiFace: string;
  readonly reportFace: string;
}

/** Size of a chart in CSS pixels. */
export interface ChartSize {
  readonly width: number;
  readonly height: number;
}

/** Below this width a chart takes its narrow form: no labels at the curves, one figure at the worst residual. */
export const NARROW_BELOW = 400;
