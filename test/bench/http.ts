import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import autocannon from "autocannon";
import { median } from "./measure.ts";
import { type Service, startService } from "./service.ts";

const ROUNDS = 5;
const SECONDS = 3;
const CONNECTIONS = 10;
/** Enough that no two requests in a round trip are alike. */
const MACHINES = 5000;

/** The smallest request, for as many machines as there are bodies. */
const BODIES = Array.from({ length: MACHINES }, (_, i) =>
  JSON.stringify({
    mass: `${(200 + i * 0.37).toFixed(2)} kg`,
    speed: "1180 rpm",
    target: { transmissibility: 0.08 },
  }),
);

async function requestsPerSecond(url: string): Promise<number> {
  const result = await autocannon({
    url,
    connections: CONNECTIONS,
    duration: SECONDS,
    requests: BODIES.map((body) => ({
      method: "POST",
      body,
      headers: { "content-type": "application/json" },
    })),
  });
  if (result.non2xx > 0 || result.errors > 0)
    throw new Error(`${url} answered ${result.non2xx} requests badly and failed ${result.errors}`);
  return result.requests.average;
}

/** Requests per second of the smallest selection against a bare route, in turn, and the memory it took. */
export async function benchHttp(): Promise<void> {
  const data = mkdtempSync(join(tmpdir(), "mountrank-bench-"));
  const bare = await startService(new URL("bare-server.js", import.meta.url));
  const ours = await startService(new URL("../../server/main.js", import.meta.url), { MOUNTRANK_DATA: data });
  try {
    const rates = await inTurn([`${bare.url}/`, `${ours.url}/v1/selections`]);
    const [bareRate, ourRate] = rates.map(median) as [number, number];
    console.log(
      `\nThe smallest selection over HTTP, ${MACHINES} different machines, ${CONNECTIONS} connections`,
    );
    console.log(`  bare Express route, parse and echo   ${bareRate.toFixed(0).padStart(7)} requests/s`);
    console.log(
      `  POST /v1/selections                  ${ourRate.toFixed(0).padStart(7)} requests/s  ${(ourRate / bareRate).toFixed(2)}×  goal ≥ 0.5×`,
    );
    console.log(
      `  memory of the service after this     ${ours.memory().toFixed(0).padStart(7)} MB          goal < 150 MB`,
    );
  } finally {
    await stopAll([bare, ours]);
    rmSync(data, { recursive: true });
  }
}

async function inTurn(urls: readonly string[]): Promise<number[][]> {
  const rates = urls.map((): number[] => []);
  for (let round = 0; round < ROUNDS; round++)
    for (const [i, url] of urls.entries()) rates[i]?.push(await requestsPerSecond(url));
  return rates;
}

async function stopAll(services: readonly Service[]): Promise<void> {
  await Promise.all(services.map((service) => service.stop()));
}
