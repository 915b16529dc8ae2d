import { createServer, type Server } from "node:http";
import type { AddressInfo } from "node:net";
import pino, { type Logger } from "pino";
import { CatalogError, openStore, type Store } from "../catalog/index.ts";
import { createApp } from "./app.ts";
import { type Config, ConfigError, readConfig } from "./config.ts";
import { closeGracefully } from "./shutdown.ts";

async function start(config: Config): Promise<void> {
  const logger = pino({ level: config.logLevel }, pino.destination({ dest: 2, sync: true }));
  const clock = () => new Date();
  const store = openStore(config.dataDir, { archiveLimit: config.archiveLimit, now: clock });
  try {
    await store.ensureDemo();
    const server = createServer(createApp({ store, config, logger, clock }));
    await listen(server, config);
    greet(server.address() as AddressInfo);
    stopOnSignal(server, store, logger);
  } catch (error) {
    store.close();
    throw error;
  }
}

class ListenError extends Error {}

const LISTEN_FAILURES: Readonly<Record<string, string>> = {
  EADDRINUSE: "another program has this port; set PORT to a free one",
  EADDRNOTAVAIL: "this machine has no such address; set HOST to one it has",
  EACCES: "this port is for administrators; set PORT to one above 1023",
};

function listen(server: Server, { host, port }: Config): Promise<void> {
  return new Promise((resolve, reject) => {
    server.once("listening", resolve);
    server.once("error", (error: NodeJS.ErrnoException) => {
      const why = LISTEN_FAILURES[error.code ?? ""] ?? error.message;
      reject(new ListenError(`cannot listen on ${host}:${port}: ${why}`));
    });
    server.listen(port, host);
  });
}

function greet({ address, family, port }: AddressInfo): void {
  const base = `http://${family === "IPv6" ? `[${address}]` : address}:${port}`;
  const body = '{"mass":"850 kg","speed":"1180 rpm","target":{"transmissibility":0.08}}';
  console.log(`mountrank is at ${base}. Try:

curl -s ${base}/v1/selections -H 'content-type: application/json' -d '${body}'
`);
}

function stopOnSignal(server: Server, store: Store, logger: Logger): void {
  const stop = async (signal: NodeJS.Signals) => {
    logger.info({ signal }, "stopping");
    await closeGracefully(server);
    store.close();
  };
  // Once each: a second signal of the kind ends the program at once, as its sender then means.
  process.once("SIGTERM", (signal) => void stop(signal));
  process.once("SIGINT", (signal) => void stop(signal));
}

try {
  await start(readConfig(process.env));
} catch (error) {
  if (!(error instanceof ConfigError || error instanceof CatalogError || error instanceof ListenError))
    throw error;
  console.error(`mountrank: ${error.message}`);
  process.exitCode = 1;
}
