import { createServer, get } from "node:http";
import type { AddressInfo } from "node:net";
import { expect, test } from "vitest";
import { closeGracefully } from "../../server/shutdown.ts";

test("a request that never ends is cut off at the limit", async () => {
  const server = createServer(() => undefined).listen(0, "127.0.0.1");
  await new Promise((resolve) => server.once("listening", resolve));
  const failed = new Promise((resolve) =>
    get({ port: (server.address() as AddressInfo).port, host: "127.0.0.1" }).once("error", resolve),
  );
  await new Promise((resolve) => server.once("request", resolve));
  const asked = performance.now();
  await closeGracefully(server, { limitMs: 200 });
  // Timers may come late on a busy machine, never early; a millisecond is for the rounding of the timer.
  expect(performance.now() - asked).toBeGreaterThan(199);
  expect(await failed).toMatchObject({ code: "ECONNRESET" });
});
