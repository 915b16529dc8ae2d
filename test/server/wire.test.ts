import { createServer, type Server } from "node:http";
import { type AddressInfo, connect } from "node:net";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { testApp } from "../support/test-app.ts";

let service: Awaited<ReturnType<typeof testApp>>;
let server: Server;
let port: number;
beforeAll(async () => {
  service = await testApp();
  server = createServer(service.app).listen(0, "127.0.0.1");
  await new Promise((resolve) => server.once("listening", resolve));
  port = (server.address() as AddressInfo).port;
});
afterAll(async () => {
  server.closeAllConnections();
  await new Promise((resolve) => server.close(resolve));
  service.close();
});

/** Writes bytes as they are, closes its own side, and gives back all that came. */
function exchange(bytes: string): Promise<string> {
  return new Promise((resolve, reject) => {
    const socket = connect(port, "127.0.0.1");
    let answer = "";
    socket.on("data", (chunk) => {
      answer += chunk;
    });
    socket.on("end", () => resolve(answer));
    socket.on("error", reject);
    socket.end(bytes);
  });
}

const CLOSE = "Host: bakery\r\nConnection: close\r\n";

describe("bytes that no well-made client sends", () => {
  test.each([
    ["that are no HTTP", "flour and water\r\n\r\n", 400],
    ["with a header of 20 kB", `GET / HTTP/1.1\r\n${CLOSE}x: ${"y".repeat(20_000)}\r\n\r\n`, 431],
    ["with two lengths", `POST / HTTP/1.1\r\n${CLOSE}Content-Length: 1\r\nContent-Length: 2\r\n\r\n{}`, 400],
    ["with a badly encoded path", `GET /v1/isolators/%C3%28 HTTP/1.1\r\n${CLOSE}\r\n`, 400],
    ["with a path that climbs", `GET /reference/assets/../../package.json HTTP/1.1\r\n${CLOSE}\r\n`, 404],
    ["with a whole address as path", `GET http://elsewhere/health/live HTTP/1.1\r\n${CLOSE}\r\n`, 200],
    ["with a method of their own", `BREW / HTTP/1.1\r\n${CLOSE}\r\n`, 400],
    ["with a method that no address has", `PATCH / HTTP/1.1\r\n${CLOSE}\r\n`, 405],
    ["with a path of 10 kB", `GET /${"x".repeat(10_000)} HTTP/1.1\r\n${CLOSE}\r\n`, 404],
    ["with a control sign in the path", `GET /%00 HTTP/1.1\r\n${CLOSE}\r\n`, 404],
  ])("%s are answered, and the service goes on", async (_, bytes, status) => {
    expect(await exchange(bytes)).toMatch(new RegExp(`^HTTP/1\\.1 ${status} `));
    expect(await exchange(`GET /health/live HTTP/1.1\r\n${CLOSE}\r\n`)).toMatch(/\{"status":"ok"\}$/);
  });

  test("a client that leaves in the middle of its body harms nobody", async () => {
    const socket = connect(port, "127.0.0.1");
    socket.write(
      "POST /v1/selections HTTP/1.1\r\nHost: bakery\r\nContent-Type: application/json\r\nContent-Length: 99\r\n\r\n{",
    );
    await new Promise((resolve) => setTimeout(resolve, 50));
    socket.destroy();
    expect(await exchange(`GET /health/ready HTTP/1.1\r\n${CLOSE}\r\n`)).toMatch(/^HTTP\/1\.1 200 /);
  });
});

test("HEAD has the headers of GET and no body, OPTIONS neither", async () => {
  const head = await exchange(`HEAD /health/live HTTP/1.1\r\n${CLOSE}\r\n`);
  expect(head).toMatch(/^HTTP\/1\.1 200 /);
  expect(head).toMatch(/Content-Length: 15\r\n/i);
  expect(head).toMatch(/\r\n\r\n$/);
  const options = await exchange(`OPTIONS /health/live HTTP/1.1\r\n${CLOSE}\r\n`);
  expect(options).toMatch(/^HTTP\/1\.1 204 /);
  expect(options).toMatch(/allow: GET, HEAD, OPTIONS\r\n/i);
});
