import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { answersPerSecond } from "./load.ts";
import { median } from "./measure.ts";
import { type Service, startService } from "./service.ts";

const ROUNDS = 7;
const SECONDS = 2;
const WARM_UP_SECONDS = 6;

const smallest = (mass: string): string =>
  JSON.stringify({ mass, speed: "1180 rpm", target: { transmissibility: 0.08 } });

/** As many machines as no round gets through, so that none is answered from the archive. */
const MACHINES = Array.from({ length: 100_000 }, (_, i) => smallest(`${(200 + i * 0.018).toFixed(3)} kg`));

/** Answers per second of the smallest selection against a bare route, in turn, and the memory it took. */
export async function benchHttp(): Promise<void> {
  const data = mkdtempSync(join(tmpdir(), "mountrank-bench-"));
  const bare = await startService(new URL("bare-server.js", import.meta.url));
  const ours = await startService(new URL("../../server/main.js", import.meta.url), { MOUNTRANK_DATA: data });
  const selections = new URL("/v1/selections", ours.url);
  const once = [smallest("850 kg")];
  try {
    // Until the compiler has done its work, the first rounds say nothing.
    for (const url of [new URL(bare.url), selections]) await answersPerSecond(url, once, WARM_UP_SECONDS);
    const rates: Record<"bare" | "same" | "different", number[]> = { bare: [], same: [], different: [] };
    for (let round = 0; round < ROUNDS; round++) {
      rates.bare.push(await answersPerSecond(new URL(bare.url), once, SECONDS));
      rates.same.push(await answersPerSecond(selections, once, SECONDS));
    }
    for (let round = 0; round < ROUNDS; round++) {
      const others = MACHINES.slice((round * MACHINES.length) / ROUNDS);
      rates.different.push(await answersPerSecond(selections, others, SECONDS));
    }
    const yardstick = median(rates.bare);
    const line = (name: string, rate: number, goal = ""): void =>
      console.log(
        `  ${name.padEnd(48)} ${rate.toFixed(0).padStart(7)} /s  ${(rate / yardstick).toFixed(2)}×  ${goal}`,
      );
    console.log("\nThe smallest selection over HTTP, 10 connections");
    line("bare Express route, parse and echo", yardstick);
    line("POST /v1/selections, the same request", median(rates.same), "goal ≥ 0.5×");
    line("POST /v1/selections, every machine a new one", median(rates.different));
    console.log(
      `  memory of the service after this ${ours.memory().toFixed(0).padStart(23)} MB  goal < 150 MB`,
    );
  } finally {
    await stopAll([bare, ours]);
    rmSync(data, { recursive: true });
  }
}

async function stopAll(services: readonly Service[]): Promise<void> {
  await Promise.all(services.map((service) => service.stop()));
}
