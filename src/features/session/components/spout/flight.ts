/** A place in centimetres: x from the spout along the table, y above the table. */
export interface Place {
  readonly x: number;
  readonly y: number;
}

export interface Spout {
  /** Lean of the can, which is the angle at which its jet rises. */
  readonly lean: number;
  /** Head of water above the spout / cm. */
  readonly head: number;
  /** Spout above the table / cm. */
  readonly height: number;
  readonly speedCoefficient: number;
}

const GRAVITY = 981.7;

/** The jet of the model, from the spout to the table: a free flight with the head H = C²h. */
export function predictedFlight(spout: Spout, points: number): Place[] {
  const effective = spout.speedCoefficient ** 2 * spout.head;
  const range = landing(effective, spout);
  const heightAt = (x: number) =>
    spout.height + x * Math.tan(spout.lean) - x ** 2 / (4 * effective * Math.cos(spout.lean) ** 2);
  return Array.from({ length: points }, (_, i) => {
    const x = (range * i) / (points - 1);
    return { x, y: heightAt(x) };
  });
}

/** R = H sin 2θ + 2 cos θ √(H(H sin²θ + y)) */
function landing(effective: number, { lean, height }: Spout): number {
  const rise = effective * Math.sin(lean) ** 2;
  return effective * Math.sin(2 * lean) + 2 * Math.cos(lean) * Math.sqrt(effective * (rise + height));
}

/** The same jet with the air's drag, which grows with the square of its speed once it has broken; `perCm` is drag over mass. */
export function draggedFlight(spout: Spout, perCm: number, breaksAtCm: number): Place[] {
  const step = 0.0005;
  const speed = spout.speedCoefficient * Math.sqrt(2 * GRAVITY * spout.head);
  let velocity = { x: speed * Math.cos(spout.lean), y: speed * Math.sin(spout.lean) };
  let place: Place = { x: 0, y: spout.height };
  const flight = [place];
  while (place.y > 0) {
    const drag = place.x < breaksAtCm ? 0 : perCm * Math.hypot(velocity.x, velocity.y);
    velocity = {
      x: velocity.x - drag * velocity.x * step,
      y: velocity.y - (GRAVITY + drag * velocity.y) * step,
    };
    place = { x: place.x + velocity.x * step, y: place.y + velocity.y * step };
    flight.push(place);
  }
  return flight;
}
