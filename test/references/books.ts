import type { IsolatorRecord } from "../../src/isolator/index.ts";

/** The springs of worked examples, as a catalogue of records; loads are wide open, since the books are silent on them. */
export const BOOK_SPRINGS: readonly IsolatorRecord[] = [
  {
    // Thomson, Theory of Vibration, vibration isolation: 100 kg on 700 kN/m, ζ = 0.20 (recalled, recomputed).
    designation: "thomson",
    family: "open_spring",
    axial: { stiffness_n_per_mm: 175 },
    damping: { ratio: 0.2 },
    load_n: { max: (100 * 9.80665) / 4 },
    source: "Thomson, Theory of Vibration, example on vibration isolation",
  },
  {
    // Grover, Mechanical Vibrations, ex. 4.10.2: 75 kg on 11.76e5 N/m, ζ = 0.2 (published).
    designation: "grover",
    family: "open_spring",
    axial: { stiffness_n_per_mm: 1176 / 3 },
    damping: { ratio: 0.2 },
    load_n: { max: (75 * 9.80665) / 3 },
    source: "Grover, Mechanical Vibrations, example 4.10.2",
  },
  {
    // Grover, Mechanical Vibrations, ex. 4.10.1 (b): 1000 kg on 9.8e4 N/m, undamped (published).
    designation: "grover-soft",
    family: "open_spring",
    axial: { stiffness_n_per_mm: 98 / 4 },
    damping: { ratio: 0 },
    load_n: { max: (1000 * 9.80665) / 4, min: (1000 * 9.80665) / 4 - 1 },
    source: "Grover, Mechanical Vibrations, example 4.10.1",
  },
];
