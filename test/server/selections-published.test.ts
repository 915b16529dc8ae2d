import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { BOOK_SPRINGS } from "../references/books.ts";
import { DEFLECTION_NEEDED_MM } from "../references/transmissibility.ts";
import { expectClose } from "../support/expect-close.ts";
import { request } from "../support/request.ts";
import { testApp } from "../support/test-app.ts";

let service: Awaited<ReturnType<typeof testApp>>;
let api: ReturnType<typeof request>;

beforeAll(async () => {
  service = await testApp();
  service.context.store.importRevision("books", BOOK_SPRINGS, { activate: true });
  api = request(service.app);
});
afterAll(() => service.close());

async function select(body: object) {
  const response = await api.post("/v1/selections").send(body);
  expect(response.status, JSON.stringify(response.body.errors)).toBe(200);
  return response.body;
}

describe("published examples through HTTP", () => {
  for (const [rpm, ...row] of DEFLECTION_NEEDED_MM)
    test(`static deflection that an undamped mount needs at ${rpm} rpm, for four efficiencies (handbook table)`, async () => {
      for (const [i, efficiency] of [80, 90, 95, 98].entries()) {
        const { needed } = await select({
          mass: 100,
          speed: rpm,
          target: { isolation_efficiency: efficiency },
        });
        expectClose(needed.static_deflection_mm, row[i] as number, {
          atol: 0.0051,
          because: "printed to the hundredth",
        });
      }
    });

  test("Rao, Mechanical Vibrations, exhaust fan: 40 kg at 1000 rpm, 10 % on four springs (recalled, recomputed)", async () => {
    const { needed } = await select({ mass: "40 kg", speed: "1000 rpm", target: { transmissibility: 0.1 } });
    expectClose(needed.frequency_ratio, 3.3166, { atol: 5e-5, because: "printed to four decimals" });
    const k = (40 * (2 * Math.PI * needed.natural_frequency_hz) ** 2) / 4;
    expectClose(k, 9969.3, { atol: 0.05, because: "printed to the tenth" });
  });

  test("Rao, Mechanical Vibrations, turntable: 1 kg, 3 Hz, 80 % reduction (recalled, recomputed)", async () => {
    const { needed } = await select({
      mass: "1 kg",
      speed: "3 Hz",
      feet: 3,
      target: { isolation_efficiency: 80 },
    });
    expectClose(needed.frequency_ratio, 2.4495, { atol: 5e-5, because: "printed to four decimals" });
    expectClose(2 * Math.PI * needed.natural_frequency_hz, 7.6953, {
      atol: 5e-5,
      because: "printed to four decimals",
    });
  });

  test("Thomson, Theory of Vibration, isolation: 100 kg, 350 N at 3000 rpm gives T 0.137 and 47.9 N (recalled, recomputed)", async () => {
    const { options } = await select({
      catalog: "books",
      mass: "100 kg",
      speed: "3000 rpm",
      excitation: [{ kind: "force", amplitude: "350 N" }],
      target: { transmissibility: 0.2 },
    });
    const option = options.find((o: { designation: string }) => o.designation === "thomson");
    expectClose(option.transmissibility, 0.136851, { atol: 5e-7, because: "printed to six decimals" });
    expectClose(option.transmitted_force_n, 47.898, { atol: 5e-4, because: "printed to three decimals" });
    expectClose(option.static_deflection_mm, 1.401, { atol: 5e-4, because: "printed to three decimals" });
    expectClose(option.natural_frequency_hz, 13.32, { atol: 0.005, because: "printed to the hundredth" });
  });

  test("Grover, Mechanical Vibrations, ex. 4.10.2: reciprocating 2 kg on 75 kg at 3000 rpm transmits 2075.84 N", async () => {
    const { options } = await select({
      catalog: "books",
      mass: "75 kg",
      speed: "3000 rpm",
      feet: 3,
      excitation: [{ kind: "unbalance", moment: "0.08 kg m" }],
      target: { transmissibility: 0.5 },
    });
    const option = options.find((o: { designation: string }) => o.designation === "grover");
    expectClose(option.transmitted_force_n, 2075.84, { atol: 0.005, because: "printed to the hundredth" });
    expectClose(option.frequency_ratio, 2.50886, { atol: 5e-6, because: "printed to five decimals" });
  });

  test("Grover, Mechanical Vibrations, ex. 4.10.1 (b): 490 N at 180 rpm on 1000 kg transmits 186.63 N", async () => {
    const { options } = await select({
      catalog: "books",
      mass: "1000 kg",
      speed: "180 rpm",
      excitation: [{ kind: "force", amplitude: "490 N" }],
      target: { transmitted_force: "200 N" },
    });
    expect(options).toHaveLength(1);
    expectClose(options[0].transmitted_force_n, 186.63, {
      atol: 0.05,
      because: "the book rounds on the way",
    });
  });
});
