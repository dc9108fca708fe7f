import { drawCan, pathOf, toDrawing, type CanDrawing, type Point } from './can.ts';
import { draggedFlight, predictedFlight, type Place, type Spout } from './flight.ts';

const SPOUT: Spout = { lean: Math.PI / 6, head: 20, height: 9, speedCoefficient: 0.967 };
const CAN = { width: 8.3, height: 34.8, spout: 4.77 };
/** Doubt of the speed coefficient, widened so that it can be seen. */
const SPEED_DOUBT = 0.012;
const DRAG_PER_CM = 0.0074;
const BREAKS_AT_CM = 14;
/** Where along the flight readings were taken / cm. */
const READINGS = [5.3, 11.7, 18, 24.4, 30.2, 35.5, 39.8];

export interface SpoutDrawing {
  readonly can: CanDrawing;
  readonly lean: number;
  readonly spout: Point;
  readonly arc: string;
  readonly band: string;
  readonly readings: readonly Point[];
  /** Marks of the ruler: x of every centimetre. */
  readonly ruler: readonly number[];
}

const onPaper = ({ x, y }: Place): Point => toDrawing(x, y);

/** The set-up, what the model predicts, and readings that fall below it once the jet has broken. */
export function drawSpout(): SpoutDrawing {
  const edge = (sign: number) =>
    predictedFlight({ ...SPOUT, speedCoefficient: SPOUT.speedCoefficient + sign * SPEED_DOUBT }, 81).map(
      onPaper,
    );
  const measured = draggedFlight(SPOUT, DRAG_PER_CM, BREAKS_AT_CM);
  return {
    can: drawCan(CAN, SPOUT),
    lean: SPOUT.lean,
    spout: toDrawing(0, SPOUT.height),
    arc: pathOf(predictedFlight(SPOUT, 81).map(onPaper)),
    band: `${pathOf([...edge(1), ...edge(-1).toReversed()])}Z`,
    readings: READINGS.map((x) => onPaper(measured.find((place) => place.x >= x) ?? { x, y: 0 })),
    ruler: Array.from({ length: 51 }, (_, cm) => toDrawing(cm, 0)[0]),
  };
}
