import { type ChildProcess, spawn } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { Agent, get } from "node:http";
import { createServer } from "node:net";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { packageRoot } from "../../server/package-info.ts";

let folder: string;
const running = new Set<ChildProcess>();

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), "mountrank-"));
});
afterEach(() => {
  for (const child of running) child.kill("SIGKILL");
  running.clear();
  rmSync(folder, { recursive: true, force: true });
});

/** Starts the program on a free port and the test's own folder. */
function start(environment: Record<string, string> = {}) {
  const child = spawn(process.execPath, ["--import", "tsx", join(packageRoot, "server", "main.ts")], {
    cwd: packageRoot,
    env: { PATH: process.env["PATH"], PORT: "0", MOUNTRANK_DATA: folder, ...environment },
  });
  running.add(child);
  const output = { stdout: "", stderr: "" };
  child.stdout.on("data", (chunk) => {
    output.stdout += chunk;
  });
  child.stderr.on("data", (chunk) => {
    output.stderr += chunk;
  });
  const ended = new Promise<number | null>((resolve) => child.once("close", resolve));
  const greeted = new Promise<string>((resolve, reject) => {
    child.stdout.on("data", () => output.stdout.includes("curl") && resolve(output.stdout));
    child.once("close", () => reject(new Error(`ended before it was ready: ${output.stderr}`)));
  });
  greeted.catch(() => undefined);
  return { child, output, ended, greeted };
}

async function addressOf(greeted: Promise<string>): Promise<string> {
  return /mountrank is at (\S+)\. Try:/.exec(await greeted)?.[1] ?? "no address";
}

describe("starting", () => {
  test("it says where it is, and the request it prints is answered", async () => {
    const { greeted } = start();
    const [, url, body] =
      /curl -s (\S+) -H 'content-type: application\/json' -d '([^']+)'/.exec(await greeted) ?? [];
    const response = await fetch(url ?? "", {
      method: "POST",
      headers: { "content-type": "application/json" },
      body: body ?? "",
    });
    expect(response.status).toBe(200);
  });

  test.each([
    ["PORT", "abc"],
    ["MOUNTRANK_ARCHIVE_LIMIT", "-3"],
    ["HOST", "203.0.113.7"],
  ])("with %s=%s it refuses with one line and exit code 1", async (name, value) => {
    const { ended, output } = start({ [name]: value });
    expect(await ended).toBe(1);
    expect(output.stderr).toMatch(/^mountrank: .+\n$/);
    expect(output.stderr).toContain(value);
    expect(output.stdout).toBe("");
  });

  test("a port that is taken is named in one line", async () => {
    const other = createServer().listen(0, "127.0.0.1");
    await new Promise((resolve) => other.once("listening", resolve));
    const { port } = other.address() as { port: number };
    const { ended, output } = start({ PORT: String(port) });
    expect(await ended).toBe(1);
    expect(output.stderr).toBe(
      `mountrank: cannot listen on 127.0.0.1:${port}: another program has this port; set PORT to a free one\n`,
    );
    other.close();
  });

  test("a data folder that is a file is refused in one line, and the file is left as it was", async () => {
    const file = join(folder, "data");
    writeFileSync(file, "flour");
    const { ended, output } = start({ MOUNTRANK_DATA: file });
    expect(await ended).toBe(1);
    expect(output.stderr).toMatch(/^mountrank: .+\n$/);
    expect(readFileSync(file, "utf8")).toBe("flour");
  });
});

describe("stopping", () => {
  test.each(["SIGTERM", "SIGINT"] as const)(
    "%s ends it cleanly though a client keeps its connection",
    async (signal) => {
      const { child, ended, greeted, output } = start();
      const address = await addressOf(greeted);
      const agent = new Agent({ keepAlive: true });
      await new Promise((resolve) =>
        get(`${address}/health/ready`, { agent }, (answer) => answer.resume().on("end", resolve)),
      );
      const asked = performance.now();
      child.kill(signal);
      expect(await ended).toBe(0);
      // Idle connections are closed every 50 ms; Node's own keep-alive would hold the program for 5 s.
      expect(performance.now() - asked).toBeLessThan(2000);
      expect(output.stderr).toBe("");
      agent.destroy();
    },
  );

  test("a request under way is answered before it ends", async () => {
    const { child, ended, greeted } = start();
    const address = new URL(await addressOf(greeted));
    const { connect } = await import("node:net");
    const socket = connect(Number(address.port), address.hostname);
    const body = '{"mass": "850 kg"';
    socket.write(
      `POST /v1/selections HTTP/1.1\r\nHost: x\r\nContent-Type: application/json\r\nContent-Length: ${body.length}\r\n\r\n`,
    );
    await new Promise((resolve) => setTimeout(resolve, 200));
    child.kill("SIGTERM");
    await new Promise((resolve) => setTimeout(resolve, 200));
    const answer = new Promise<string>((resolve) => socket.once("data", (chunk) => resolve(String(chunk))));
    socket.write(body);
    expect(await answer).toMatch(/^HTTP\/1\.1 400 /);
    expect(await ended).toBe(0);
  });
});
