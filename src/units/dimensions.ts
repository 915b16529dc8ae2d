import type { Dimension, SymbolOf } from "./table.ts";

interface Usage<D extends Dimension> {
  /** With its article, for sentences. */
  readonly called: string;
  /** The unit of a bare number in the HTTP interface. */
  readonly documented: SymbolOf<D>;
  /** The unit inside `src`. */
  readonly si: SymbolOf<D>;
  readonly example: string;
}

/** How each dimension is spoken of, given and kept. */
export const DIMENSIONS: { readonly [D in Dimension]: Usage<D> } = {
  mass: { called: "a mass", documented: "kg", si: "kg", example: "850 kg" },
  speed: { called: "a speed", documented: "rpm", si: "rad/s", example: "1180 rpm" },
  frequency: { called: "a frequency", documented: "Hz", si: "rad/s", example: "19.7 Hz" },
  length: { called: "a length", documented: "m", si: "m", example: "25 mm" },
  force: { called: "a force", documented: "N", si: "N", example: "350 N" },
  stiffness: { called: "a stiffness", documented: "N/m", si: "N/m", example: "35 kN/m" },
  damping: { called: "a damping coefficient", documented: "N s/m", si: "N s/m", example: "400 N s/m" },
  inertia: { called: "a moment of inertia", documented: "kg m2", si: "kg m2", example: "120 kg m2" },
  unbalance: { called: "an unbalance", documented: "g mm", si: "kg m", example: "900 g mm" },
  time: { called: "a time", documented: "s", si: "s", example: "8 s" },
  temperature: { called: "a temperature", documented: "°C", si: "K", example: "45 degC" },
  velocity: { called: "a velocity", documented: "mm/s", si: "m/s", example: "2.8 mm/s" },
  acceleration: { called: "an acceleration", documented: "m/s2", si: "m/s2", example: "1.5 m/s2" },
  angle: { called: "an angle", documented: "deg", si: "rad", example: "90 deg" },
  mobility: { called: "a mobility", documented: "m/s/N", si: "m/s/N", example: "1e-6 m/s/N" },
  pressure: { called: "a pressure", documented: "kPa", si: "Pa", example: "550 kPa" },
  volume: { called: "a volume", documented: "L", si: "m3", example: "2.5 L" },
};

/** Per dimension, the unit of a bare number in the HTTP interface. */
export const DOCUMENTED_UNIT = each("documented");

/** Per dimension, the unit inside `src`: coherent SI; rad/s for speeds and for frequencies alike. */
export const SI_UNIT = each("si");

function each(use: "documented" | "si"): { readonly [D in Dimension]: SymbolOf<D> } {
  const entries = Object.entries(DIMENSIONS).map(([dimension, usage]) => [dimension, usage[use]]);
  return Object.fromEntries(entries) as { [D in Dimension]: SymbolOf<D> };
}
