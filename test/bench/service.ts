import { type ChildProcess, spawn } from "node:child_process";
import { readFileSync } from "node:fs";
import { performance } from "node:perf_hooks";

const ADDRESS = /http:\/\/127\.0\.0\.1:\d+/;

/** As `npm start` has it: a small young generation, for the sake of memory. */
const NODE_FLAGS = ["--max-semi-space-size=8"];

/** A server in a process of its own. */
export interface Service {
  readonly url: string;
  /** From the start of the process until it printed its address, ms. */
  readonly startedIn: number;
  /** Resident memory, MB. */
  readonly memory: () => number;
  readonly stop: () => Promise<void>;
}

/** Starts a compiled program of ours and waits for the address that it prints. */
export function startService(
  script: URL,
  environment: Readonly<Record<string, string>> = {},
): Promise<Service> {
  const start = performance.now();
  const child: ChildProcess = spawn(process.execPath, [...NODE_FLAGS, script.pathname], {
    env: { ...process.env, PORT: "0", ...environment },
    stdio: ["ignore", "pipe", "inherit"],
  });
  return new Promise((resolve, reject) => {
    let printed = "";
    child.once("exit", (code) =>
      reject(new Error(`${script.pathname} ended with ${code} before it listened`)),
    );
    child.stdout?.on("data", (chunk: Buffer) => {
      printed += chunk.toString();
      const [url] = ADDRESS.exec(printed) ?? [];
      if (url === undefined) return;
      child.removeAllListeners("exit");
      resolve({
        url,
        startedIn: performance.now() - start,
        memory: () => residentMegabytes(child.pid as number),
        stop: () =>
          new Promise((stopped) => {
            child.once("exit", () => stopped());
            child.kill("SIGTERM");
          }),
      });
    });
  });
}

function residentMegabytes(pid: number): number {
  const [, kB] = /VmRSS:\s+(\d+) kB/.exec(readFileSync(`/proc/${pid}/status`, "utf8")) ?? [];
  return Number(kB) / 1024;
}
