import type { Exposure, Family } from "./isolator.ts";

/**
 * One isolator as a record of a catalogue, an import or an inline entry: plain numbers in the units of their
 * keys. `catalog/isolator.schema.json` is its checked form.
 */
export interface IsolatorRecord {
  readonly designation: string;
  readonly series?: string;
  readonly family: Family;
  readonly axial:
    | { readonly stiffness_n_per_mm: number }
    | { readonly curve: readonly (readonly [deflectionMm: number, loadN: number])[] }
    | { readonly natural_frequency_hz: number };
  readonly dynamic_ratio?: number | readonly (readonly [hz: number, ratio: number])[];
  readonly damping: { readonly ratio: number } | { readonly loss_factor: number };
  readonly lateral_ratio?: number;
  readonly load_n: { readonly min?: number; readonly max: number; readonly rated?: number };
  readonly travel_mm?: number;
  readonly tolerance?: number;
  readonly temperature_c?: { readonly min: number; readonly max: number };
  readonly resists?: readonly Exposure[];
  readonly captive?: boolean;
  readonly free_height_mm?: number;
  readonly outside_diameter_mm?: number;
  readonly footprint_mm?: { readonly length: number; readonly width: number };
  readonly thread?: string;
  readonly mass_kg?: number;
  readonly price?: number;
  readonly currency?: string;
  readonly lead_time_days?: number;
  readonly source?: string;
}
