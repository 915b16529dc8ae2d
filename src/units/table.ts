import { type Unit, unit } from "./unit.ts";

/** Standard acceleration of gravity g_n, m/s² (exact; 3rd CGPM 1901, ISO 80000-3). */
export const STANDARD_GRAVITY = 9.80665;

// Exact by the international yard and pound agreement of 1959, in m and kg.
const INCH = 0.0254;
const FOOT = 0.3048;
const POUND = 0.453_592_37;

/** lbf in N: a pound under standard gravity, exact in its fourteen digits. */
const POUND_FORCE = 4.448_221_615_260_5;

/** One turn in rad. */
const TURN = 2 * Math.PI;

/** Rotation and oscillation are one dimension, told apart only by the unit a bare number has. Reference: turns a second. */
const ROTATION = {
  rpm: unit(1, 60, "r/min", "rev/min", "1/min", "/min", "min-1", "r p m", "cpm", "c/min"),
  Hz: unit(1, 1, "r/s", "rev/s", "rps", "cps", "c/s", "hertz"),
  "rad/s": unit(1, TURN),
  "deg/s": unit(1, 360, "°/s"),
};

/**
 * Every unit the program knows, by dimension and symbol. The reference is the coherent SI unit, but the turn
 * for angles and rotation, where radians would put π into every line, and the ice point for temperatures.
 *
 * Sources: ISO 80000-3 and -4; US customary units by their 1959 definitions (NIST SP 811, appendix B).
 */
export const UNITS = {
  mass: {
    kg: unit(1, 1, "kgs", "kilo", "kilos", "kilogram", "kilograms"),
    g: unit(1, 1000, "gram", "grams"),
    t: unit(1000, 1, "tonne", "tonnes", "metric ton", "metric tons"),
    lb: unit(45_359_237, 1e8, "lbs", "lbm", "pound", "pounds"),
    oz: unit(45_359_237, 16e8, "ounce", "ounces"),
    slug: unit(POUND_FORCE, FOOT, "slugs"),
    "short ton": unit(90_718_474, 1e5, "short tons", "US ton", "US tons"),
    "long ton": unit(10_160_469_088, 1e7, "long tons", "UK ton", "UK tons"),
  },
  speed: ROTATION,
  frequency: ROTATION,
  length: {
    m: unit(1, 1, "metre", "metres", "meter", "meters"),
    mm: unit(1, 1000, "millimetre", "millimetres", "millimeter", "millimeters"),
    cm: unit(1, 100),
    µm: unit(1, 1e6, "um", "micron", "microns"),
    in: unit(254, 1e4, '"', "''", "″", "”", "inch", "inches"),
    ft: unit(3048, 1e4, "'", "′", "’", "foot", "feet"),
    mil: unit(254, 1e7, "mils", "thou"),
  },
  force: {
    N: unit(1, 1, "newton", "newtons"),
    mN: unit(1, 1000),
    daN: unit(10, 1),
    kN: unit(1000, 1),
    MN: unit(1e6, 1),
    lbf: unit(POUND_FORCE, 1, "lbsf", "pound force"),
    kip: unit(1000 * POUND_FORCE, 1, "kips", "klbf"),
    kgf: unit(980_665, 1e5, "kp"),
  },
  // The trade writes lb and kg for lbf and kgf here; no other reading is possible.
  stiffness: {
    "N/m": unit(1, 1),
    "N/mm": unit(1000, 1),
    "N/cm": unit(100, 1),
    "kN/m": unit(1000, 1),
    "kN/mm": unit(1e6, 1),
    "MN/m": unit(1e6, 1),
    "lbf/in": unit(POUND_FORCE, INCH, "lb/in", "lbs/in", "lbf/inch", "lb/inch", "lbs/inch"),
    "lbf/ft": unit(POUND_FORCE, FOOT, "lb/ft", "lbs/ft"),
    "kip/in": unit(1000 * POUND_FORCE, INCH, "kips/in"),
    "kgf/mm": unit(9806.65, 1, "kg/mm", "kp/mm"),
    "kgf/cm": unit(980.665, 1, "kg/cm", "kp/cm"),
  },
  damping: {
    "N s/m": unit(1, 1, "N/(m/s)"),
    "N s/mm": unit(1000, 1, "N/(mm/s)"),
    "kN s/m": unit(1000, 1, "kN/(m/s)"),
    "lbf s/in": unit(POUND_FORCE, INCH, "lb s/in", "lbf/(in/s)"),
    "lbf s/ft": unit(POUND_FORCE, FOOT, "lb s/ft", "lbf/(ft/s)"),
  },
  inertia: {
    "kg m2": unit(1, 1),
    "kg cm2": unit(1, 1e4),
    "kg mm2": unit(1, 1e6),
    "g cm2": unit(1, 1e7),
    "t m2": unit(1000, 1),
    "lb in2": unit(POUND * INCH * INCH, 1, "lbm in2"),
    "lb ft2": unit(POUND * FOOT * FOOT, 1, "lbm ft2"),
    "lbf in s2": unit(POUND_FORCE * INCH, 1, "lb in s2"),
    "slug ft2": unit(POUND_FORCE * FOOT, 1, "lbf ft s2", "lb ft s2"),
  },
  unbalance: {
    "kg m": unit(1, 1),
    "g m": unit(1, 1000),
    "kg mm": unit(1, 1000),
    "g cm": unit(1, 1e5),
    "g mm": unit(1, 1e6),
    "g in": unit(254, 1e7),
    "oz in": unit(45_359_237 * 254, 16e12),
    "lb in": unit(45_359_237 * 254, 1e12, "lbm in"),
  },
  time: {
    s: unit(1, 1, "sec", "secs", "second", "seconds"),
    ms: unit(1, 1000),
    min: unit(60, 1, "mins", "minute", "minutes"),
    h: unit(3600, 1, "hr", "hrs", "hour", "hours"),
  },
  temperature: {
    "°C": unit(1, 1, "C", "deg C", "° C", "celsius"),
    K: { ...unit(1, 1, "kelvin"), zero: 273.15 },
    "°F": { ...unit(5, 9, "F", "deg F", "° F", "fahrenheit"), zero: 32 },
  },
  velocity: {
    "m/s": unit(1, 1),
    "cm/s": unit(1, 100),
    "mm/s": unit(1, 1000),
    "µm/s": unit(1, 1e6, "um/s"),
    "in/s": unit(254, 1e4, "ips", "in/sec", "inch/s"),
    "ft/s": unit(3048, 1e4, "fps", "ft/sec"),
  },
  acceleration: {
    "m/s2": unit(1, 1),
    "mm/s2": unit(1, 1000),
    gn: unit(980_665, 1e5, "g", "gee"),
    "in/s2": unit(254, 1e4),
    "ft/s2": unit(3048, 1e4),
  },
  angle: {
    rad: unit(1, TURN),
    mrad: unit(1, 1000 * TURN),
    deg: unit(1, 360, "°", "degree", "degrees"),
    turn: unit(1, 1, "turns", "rev"),
  },
  mobility: {
    "m/s/N": unit(1, 1, "m/(s N)", "m/(N s)", "m/N/s", "(m/s)/N"),
    "mm/s/N": unit(1, 1000, "mm/(s N)", "mm/(N s)", "mm/N/s", "(mm/s)/N"),
    "in/s/lbf": unit(INCH, POUND_FORCE, "in/(s lbf)", "in/(lbf s)", "(in/s)/lbf"),
  },
  pressure: {
    Pa: unit(1, 1),
    kPa: unit(1000, 1),
    MPa: unit(1e6, 1, "N/mm2"),
    bar: unit(1e5, 1),
    mbar: unit(100, 1),
    psi: unit(POUND_FORCE, INCH * INCH, "lbf/in2", "lb/in2"),
  },
  volume: {
    m3: unit(1, 1),
    L: unit(1, 1000, "dm3", "litre", "litres", "liter", "liters"),
    mL: unit(1, 1e6, "cm3", "cc"),
    mm3: unit(1, 1e9),
    in3: unit(INCH ** 3, 1, "cu in"),
    ft3: unit(FOOT ** 3, 1, "cu ft"),
  },
} satisfies Record<string, Record<string, Unit>>;

export type Dimension = keyof typeof UNITS;

/** The symbols of a dimension. */
export type SymbolOf<D extends Dimension> = keyof (typeof UNITS)[D] & string;

/** Any symbol of the table; no symbol means two things. */
export type UnitSymbol = { [D in Dimension]: SymbolOf<D> }[Dimension];

/** The units of a dimension, by symbol. */
export function unitsOf(dimension: Dimension): Readonly<Record<string, Unit>> {
  return UNITS[dimension];
}
