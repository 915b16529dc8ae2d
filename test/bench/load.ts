import { performance } from "node:perf_hooks";
import { Pool } from "undici";

const CONNECTIONS = 10;

/**
 * Posts bodies in turn over a few connections for some seconds.
 * @returns answers per second
 */
export async function answersPerSecond(
  url: URL,
  bodies: readonly string[],
  seconds: number,
): Promise<number> {
  const pool = new Pool(url.origin, { connections: CONNECTIONS, pipelining: 1 });
  const start = performance.now();
  const end = start + seconds * 1000;
  let answered = 0;
  const post = async (): Promise<void> => {
    while (performance.now() < end) {
      const body = bodies[answered % bodies.length] as string;
      answered++;
      const answer = await pool.request({
        path: url.pathname,
        method: "POST",
        body,
        headers: { "content-type": "application/json" },
      });
      if (answer.statusCode !== 200) throw new Error(`${url} answered ${answer.statusCode}`);
      await answer.body.dump({ limit: 1e6 });
    }
  };
  await Promise.all(Array.from({ length: CONNECTIONS }, post));
  const rate = answered / ((performance.now() - start) / 1000);
  await pool.close();
  return rate;
}
