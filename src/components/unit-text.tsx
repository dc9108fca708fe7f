import { unitToText } from '#shared/formatting/unit-text.ts';

/** A unit as it is printed: upright, "m s⁻²"; nothing for a pure number. */
export function UnitText({ unit }: { readonly unit: string }) {
  return unit === '1' ? null : <span className="whitespace-nowrap">{unitToText(unit)}</span>;
}
