import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { columnsOf, type Isolator } from "../../src/isolator/index.ts";
import type { Machine } from "../../src/machine/index.ts";
import { select } from "../../src/selection/index.ts";
import {
  arbitraryCatalogue,
  arbitraryMachine,
  isolator,
  machine,
  request,
  uprightFeet,
} from "./arbitrary.ts";

const G = 9.80665;

/**
 * Transmissibility of one isolator on every foot, written out from its record: a second way to the same number,
 * by complex amplitudes instead of the closed form.
 */
function recomputed(mount: Isolator, on: Machine): number {
  return Math.max(...on.orders.map((order) => recomputedAt(mount, on, order)));
}

function recomputedAt(mount: Isolator, { mass, footCount, speed }: Machine, order: number): number {
  const load = (mass * G) / footCount;
  const { axial, damping } = mount;
  const kappa = mount.dynamicRatio as number;
  const rate = (weight: number): number =>
    axial.kind === "linear"
      ? kappa * axial.stiffness
      : axial.kind === "air"
        ? (weight * (2 * Math.PI * axial.naturalFrequencyHz) ** 2) / G
        : Number.NaN;
  const k = rate(load);
  const omega = order * speed.max;
  const loss =
    damping.kind === "structural"
      ? damping.lossFactor * k
      : 2 * damping.ratio * Math.sqrt((rate(mount.load.rated) * mount.load.rated) / G) * omega;
  const x = 1 / Math.hypot(k - (mass / footCount) * omega ** 2, loss);
  return Math.hypot(k, loss) * x;
}

function fits(mount: Isolator, { mass, footCount }: Machine): boolean {
  const load = (mass * G) / footCount;
  return load >= mount.load.min && load <= mount.load.max;
}

/** A natural frequency within a fifth of an excitation line, by the record. */
function resonates(mount: Isolator, on: Machine): boolean {
  const load = (on.mass * G) / on.footCount;
  const { axial } = mount;
  const frequency =
    axial.kind === "air"
      ? axial.naturalFrequencyHz
      : axial.kind === "linear"
        ? Math.sqrt(((mount.dynamicRatio as number) * axial.stiffness * G) / load) / (2 * Math.PI)
        : Number.NaN;
  return on.orders.some((order) => Math.abs(frequency / ((order * on.speed.max) / (2 * Math.PI)) - 1) < 0.2);
}

const arbitraryTarget = fc.double({ min: 0.01, max: 0.6, noNaN: true });
const close = (a: number, b: number): boolean => Math.abs(a - b) <= 1e-9 * Math.abs(b);

describe("a selection on feet known by number", () => {
  test("returns only isolators that meet the target when recomputed from their records", () => {
    fc.assert(
      fc.property(arbitraryCatalogue, arbitraryMachine, arbitraryTarget, (list, on, transmissibility) => {
        const target = { transmissibility, transmittedForce: null, judgedOn: "foot_sum" as const };
        for (const option of select(request({ machine: on, target }), columnsOf(list)).options) {
          const [mount] = option.arrangement as [Isolator];
          const again = recomputed(mount, on);
          expect(close(again, option.analysis.worst?.transmissibility as number)).toBe(true);
          expect(again).toBeLessThanOrEqual(transmissibility * (1 + 1e-12));
          expect(fits(mount, on)).toBe(true);
        }
      }),
    );
  });

  test("leaves out no isolator that meets the target", () => {
    fc.assert(
      fc.property(arbitraryCatalogue, arbitraryMachine, arbitraryTarget, (list, on, transmissibility) => {
        const target = { transmissibility, transmittedForce: null, judgedOn: "foot_sum" as const };
        const { options } = select(request({ machine: on, target }), columnsOf(list));
        const found = options.map((option) => option.arrangement[0]?.designation).sort();
        const expected = list
          .filter((mount) => fits(mount, on) && !resonates(mount, on))
          .filter((mount) => recomputed(mount, on) <= transmissibility)
          .map((mount) => mount.designation)
          .sort();
        expect(found).toEqual(expected);
      }),
    );
  });

  test("counts every isolator once: passing and rejected make up what was examined", () => {
    fc.assert(
      fc.property(arbitraryCatalogue, arbitraryMachine, (list, on) => {
        const { counts } = select(request({ machine: on }), columnsOf(list));
        const rejected = [...counts.rejected.values()].reduce((s, n) => s + n, 0);
        expect(counts.passing + rejected).toBe(counts.examined);
        expect(counts.examined).toBe(list.length);
      }),
    );
  });

  test("ranks in a total order that does not hang on the order of the catalogue", () => {
    fc.assert(
      fc.property(
        arbitraryCatalogue,
        arbitraryMachine,
        fc.constantFrom("price", "stability", "margin", "transmitted_force", null),
        (list, on, rankBy) => {
          const ask = request({ machine: on, rankBy: rankBy as "price" | null });
          const names = (of: readonly Isolator[]): unknown =>
            select(ask, columnsOf(of)).options.map((o) => [
              o.rank,
              o.arrangement[0]?.designation,
              o.unbeaten,
            ]);
          expect(names([...list].reverse())).toEqual(names(list));
        },
      ),
    );
  });

  test("marks as unbeaten exactly the options that no other beats on price, transmissibility and deflection", () => {
    fc.assert(
      fc.property(arbitraryCatalogue, arbitraryMachine, (list, on) => {
        const { options } = select(request({ machine: on }), columnsOf(list));
        const marks = options.map((o) => [
          o.price ?? Infinity,
          o.analysis.worst?.transmissibility as number,
          o.analysis.staticDeflection,
        ]);
        options.forEach((option, i) => {
          const mine = marks[i] as number[];
          const beaten = marks.some(
            (other) =>
              other.every((v, j) => v <= (mine[j] as number)) &&
              other.some((v, j) => v < (mine[j] as number)),
          );
          expect(option.unbeaten).toBe(!beaten);
        });
      }),
    );
  });
});

describe("an isolator whose stiffness varies is judged as it is, not as it is rated", () => {
  // At 2084 N a foot and 1180 rpm an undamped mount may have 240 N/mm for a transmissibility of 0.08.
  test("a curve that is soft at the working load passes, though stiff at its rated load", () => {
    const points = [
      [0.01, 1000],
      [0.02, 2100],
      [0.025, 6000],
    ] as const;
    const mount = isolator({ axial: { kind: "curve", points }, load: { min: 500, max: 6000, rated: 6000 } });
    const { options } = select(request(), columnsOf([mount]));
    expect(options).toHaveLength(1);
    expect(options[0]?.analysis.worst?.transmissibility).toBeLessThan(0.08);
  });

  test("a mount that stiffens with frequency fails at the frequency of the machine", () => {
    const stiffening = isolator({
      dynamicRatio: [
        [1, 1],
        [4, 1],
        [15, 6],
      ],
    });
    const { counts } = select(request(), columnsOf([stiffening]));
    expect([...counts.rejected]).toEqual([["transmissibility", 1]]);
    expect(select(request(), columnsOf([isolator()])).counts.passing).toBe(1);
  });
});

describe("isolators that stand inclined", () => {
  test("are not screened by the vertical stiffness they do not have", () => {
    // k(cos²θ + λ·sin²θ): 400 N/mm along the axis are 170 N/mm upward at 60° with λ = 0.23.
    const s = Math.sin(Math.PI / 3);
    const feet = [-0.6, 0.6].flatMap((x) =>
      [-0.4, 0.4].map((y) => ({ position: [x, y, 0] as const, axis: [0, -Math.sign(y) * s, 0.5] as const })),
    );
    const rigid = {
      mass: 850,
      centreOfGravity: [0, 0, 0.1] as const,
      inertia: { xx: 80, yy: 150, zz: 180, xy: 0, xz: 0, yz: 0 },
    };
    const on = machine({
      feet,
      rigid,
      excitationPoint: rigid.centreOfGravity,
      centreOfGravity: { x: 0, y: 0 },
    });
    const mount = isolator({
      axial: { kind: "linear", stiffness: 400e3 },
      lateralRatio: 0.23,
      load: { min: 0, max: 6000, rated: 6000 },
    });
    const target = { transmissibility: 0.08, transmittedForce: null, judgedOn: "net" as const };
    const { options } = select(request({ machine: on, target }), columnsOf([mount]));
    expect(options).toHaveLength(1);
    const upright = machine({ footCount: 4 });
    expect(select(request({ machine: upright }), columnsOf([mount])).options).toEqual([]);
  });
});

describe("an isolator is rejected at its first gate", () => {
  const gateOf = (mount: Partial<Isolator>, ask = request()): string | undefined =>
    [...select(ask, columnsOf([isolator(mount)])).counts.rejected.keys()][0];

  test("and passes when nothing stands against it", () => {
    expect(gateOf({})).toBeUndefined();
  });

  const limits = request().limits;
  const environment = request().environment;
  test.each([
    ["family", {}, request({ limits: { ...limits, families: ["elastomer_pad"] } })],
    ["mounting", { family: "spring_hanger" as const }, request()],
    ["mounting", {}, request({ mounting: "suspended" })],
    ["captive", {}, request({ environment: { ...environment, captive: true } })],
    [
      "temperature",
      { temperature: { min: 263, max: 330 } },
      request({ environment: { ...environment, temperature: { min: 250, max: 300 } } }),
    ],
    [
      "exposure",
      { resists: ["oil" as const] },
      request({ environment: { ...environment, exposures: ["ozone"] } }),
    ],
    ["free_height", {}, request({ limits: { ...limits, freeHeight: 0.1 } })],
    ["free_height", { freeHeight: null }, request({ limits: { ...limits, freeHeight: 1 } })],
    ["lead_time", {}, request({ limits: { ...limits, leadTimeDays: 5 } })],
    ["price", {}, request({ limits: { ...limits, price: 199 } })],
    ["price", { price: null, currency: null }, request({ limits: { ...limits, price: 1000 } })],
    ["price", {}, request({ limits: { ...limits, price: 1000, currency: "USD" } })],
    ["underloaded", { load: { min: 2200, max: 2500, rated: 2500 } }, request()],
    ["overloaded", { load: { min: 500, max: 2000, rated: 2000 } }, request()],
    ["static_deflection", {}, request({ limits: { ...limits, staticDeflection: 0.02 } })],
    [
      "transmissibility",
      {},
      request({ target: { transmissibility: 0.01, transmittedForce: null, judgedOn: "foot_sum" as const } }),
    ],
    [
      "transmitted_force",
      {},
      request({
        machine: machine({
          excitations: [
            { kind: "force", amplitude: 350, direction: [0, 0, 1], order: 1, phase: 0, at: null },
          ],
        }),
        target: { transmissibility: 0.5, transmittedForce: 1, judgedOn: "foot_sum" },
      }),
    ],
    // 2084 N a foot on 3.2 MN/m is 19.6 Hz, at 1180 rpm = 19.7 Hz; damping of a half lets the target pass first.
    [
      "resonance",
      {
        axial: { kind: "linear" as const, stiffness: 3.2e6 },
        damping: { kind: "viscous" as const, ratio: 0.5 },
      },
      request({ target: { transmissibility: 2, transmittedForce: null, judgedOn: "foot_sum" as const } }),
    ],
  ])("%s", (gate, mount, ask) => {
    expect(gateOf(mount, ask)).toBe(gate);
  });
});

describe("near misses", () => {
  test("name the isolator, the gate and the number that failed, nearest first", () => {
    const list = [
      isolator({ designation: "good" }),
      isolator({ designation: "a-little-stiff", axial: { kind: "linear", stiffness: 265e3 } }),
      isolator({ designation: "a-little-weak", load: { min: 500, max: 2000, rated: 2000 } }),
      isolator({ designation: "far-too-weak", load: { min: 50, max: 200, rated: 200 } }),
    ];
    const { nearMisses } = select(request(), columnsOf(list));
    expect(nearMisses.map(({ designation, gate }) => [designation, gate])).toEqual([
      ["a-little-weak", "overloaded"],
      ["a-little-stiff", "transmissibility"],
    ]);
    expect(nearMisses[0]?.limit).toBe(2000);
    expect(nearMisses[0]?.value).toBeCloseTo((850 * G) / 4, 9);
  });

  test("name an arrangement that is a little too dear", () => {
    const ask = request({ limits: { ...request().limits, price: 190, currency: "EUR" } });
    expect(select(ask, columnsOf([isolator()])).nearMisses).toEqual([
      { designation: "spring", gate: "price", value: 200, limit: 190 },
    ]);
  });

  test("leave out what failed two gates", () => {
    const both = isolator({
      axial: { kind: "linear", stiffness: 265e3 },
      load: { min: 500, max: 2000, rated: 2000 },
    });
    expect(select(request(), columnsOf([both])).nearMisses).toEqual([]);
  });
});

describe("a selection on feet known by place", () => {
  const feet = uprightFeet([
    [-0.6, -0.4, 0],
    [0.6, -0.4, 0],
    [-0.6, 0.4, 0],
    [0.6, 0.4, 0],
  ]);
  const series = [1500, 2000, 2500, 3000, 4000].map((max) =>
    isolator({
      designation: `s${max}`,
      series: "S",
      axial: { kind: "linear", stiffness: max / 0.025 },
      load: { min: 0.4 * max, max, rated: max },
    }),
  );

  test("gives each foot a rating for its own load, within two ratings of one series", () => {
    const on = machine({ feet, centreOfGravity: { x: 0.2, y: 0 } });
    const { options } = select(request({ machine: on }), columnsOf(series));
    const level = options.reduce((a, b) => (b.analysis.levelness < a.analysis.levelness ? b : a));
    const [a, b, c, d] = level.arrangement as readonly Isolator[];
    expect(a).toBe(c);
    expect(b).toBe(d);
    expect((b as Isolator).load.max).toBeGreaterThan((a as Isolator).load.max);
    for (const option of options) {
      expect(new Set(option.arrangement).size).toBeLessThanOrEqual(2);
      for (const foot of option.analysis.feet) {
        expect(foot.load).toBeGreaterThanOrEqual(foot.isolator.load.min);
        expect(foot.load).toBeLessThanOrEqual(foot.isolator.load.max);
      }
      const total = option.analysis.feet.reduce((s, foot) => s + foot.load, 0);
      expect(close(total, 850 * G)).toBe(true);
    }
  });

  test("mixes nothing when one rating an arrangement is asked for", () => {
    const on = machine({ feet, centreOfGravity: { x: 0.2, y: 0 } });
    const ask = request({ machine: on, limits: { ...request().limits, ratingsPerArrangement: 1 } });
    for (const option of select(ask, columnsOf(series)).options)
      expect(new Set(option.arrangement).size).toBe(1);
  });

  test("lifts no foot: with the weight near one corner the opposite one fails as uplift", () => {
    const on = machine({ feet, centreOfGravity: { x: 0.5, y: 0.33 } });
    const { counts } = select(
      request({ machine: on }),
      columnsOf([isolator({ load: { min: 0, max: 1e5, rated: 1e5 } })]),
    );
    expect([...counts.rejected]).toEqual([["uplift", 1]]);
  });
});
