import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import type { Express } from "express";
import pino from "pino";
import { openStore } from "../../catalog/index.ts";
import { mount } from "../../server/app.ts";
import { type Config, readConfig } from "../../server/config.ts";
import { engineVersion } from "../../server/package-info.ts";
import type { Context, Route } from "../../server/route.ts";
import { routes as allRoutes } from "../../server/routes/index.ts";

interface TestApp {
  readonly app: Express;
  readonly context: Context;
  /** Closes the catalogue and removes its folder. */
  close(): void;
}

interface TestAppOptions {
  readonly config?: Partial<Config>;
  /** In place of the service's own routes. */
  readonly routes?: readonly Route[];
  /** In place of, or beside, the usual parts of the context. */
  readonly context?: Partial<Context>;
}

/** The service on a new folder with the demo catalogue, without a port and without a log. */
export async function testApp(options: TestAppOptions = {}): Promise<TestApp> {
  const folder = mkdtempSync(join(tmpdir(), "mountrank-"));
  const config = { ...readConfig({}), dataDir: folder, ...options.config };
  const clock = () => new Date("2026-01-05T08:00:00Z");
  const store = openStore(config.dataDir, { archiveLimit: config.archiveLimit, now: clock });
  await store.ensureDemo();
  const context: Context = {
    store,
    config,
    logger: pino({ level: "silent" }),
    clock,
    engineVersion,
    ...options.context,
  };
  return {
    app: mount(options.routes ?? allRoutes, context),
    context,
    close() {
      store.close();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}
