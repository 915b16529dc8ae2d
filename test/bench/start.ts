import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { median } from "./measure.ts";
import { startService } from "./service.ts";

const ROUNDS = 7;
const MAIN = new URL("../../server/main.js", import.meta.url);

/** Time from the start of `node` until the service has listened and said so, on an existing data folder. */
export async function benchStart(): Promise<void> {
  const data = mkdtempSync(join(tmpdir(), "mountrank-bench-"));
  try {
    const start = async (): Promise<number> => {
      const service = await startService(MAIN, { MOUNTRANK_DATA: data });
      const ready = await fetch(`${service.url}/health/ready`);
      if (!ready.ok) throw new Error(`/health/ready answered ${ready.status}`);
      await service.stop();
      return service.startedIn;
    };
    const first = await start();
    const times: number[] = [];
    for (let round = 0; round < ROUNDS; round++) times.push(await start());
    console.log("\nStart of the service");
    console.log(`  first start, empty folder            ${first.toFixed(0).padStart(7)} ms`);
    console.log(
      `  start on an existing folder          ${median(times).toFixed(0).padStart(7)} ms          goal ≤ 1000 ms`,
    );
  } finally {
    rmSync(data, { recursive: true });
  }
}
