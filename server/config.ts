/** Everything the environment decides, read once when the program starts. */
export interface Config {
  readonly host: string;
  /** 0 lets the system choose a free one. */
  readonly port: number;
  /** Folder of the catalogue and the archive, relative to where the program was started. */
  readonly dataDir: string;
  /** Selections kept for `GET /v1/selections/{id}`; the oldest go first. */
  readonly archiveLimit: number;
  readonly apiKeys: readonly string[];
  /** Which routes need a key when there are keys: those that write, or all data routes. */
  readonly requireKey: "writing" | "all";
  readonly logLevel: LogLevel;
}

const LOG_LEVELS = ["silent", "fatal", "error", "warn", "info", "debug", "trace"] as const;
type LogLevel = (typeof LOG_LEVELS)[number];

/** A variable of the environment that cannot be used. The message is one line that names it. */
export class ConfigError extends Error {
  override readonly name = "ConfigError";
}

/**
 * Reads the configuration. A variable that is empty counts as not set.
 *
 * @param environment  names and values, usually `process.env`
 * @throws {ConfigError} naming the first variable that cannot be used, its value and what it may be
 */
export function readConfig(environment: Readonly<Record<string, string | undefined>>): Config {
  const value = (name: string, fallback: string) => environment[name]?.trim() || fallback;

  const apiKeys = value("MOUNTRANK_API_KEYS", "")
    .split(",")
    .map((key) => key.trim())
    .filter((key) => key !== "");
  const requireKey = oneOf("MOUNTRANK_REQUIRE_KEY", value("MOUNTRANK_REQUIRE_KEY", "writing"), [
    "writing",
    "all",
  ] as const);
  if (requireKey === "all" && apiKeys.length === 0) {
    throw new ConfigError("MOUNTRANK_REQUIRE_KEY is all, but MOUNTRANK_API_KEYS names no key");
  }

  return {
    host: value("HOST", "127.0.0.1"),
    port: wholeNumber("PORT", value("PORT", "4080"), 0, 65_535),
    dataDir: value("MOUNTRANK_DATA", "data"),
    archiveLimit: wholeNumber(
      "MOUNTRANK_ARCHIVE_LIMIT",
      value("MOUNTRANK_ARCHIVE_LIMIT", "10000"),
      1,
      10_000_000,
    ),
    apiKeys,
    requireKey,
    logLevel: oneOf("LOG_LEVEL", value("LOG_LEVEL", "warn"), LOG_LEVELS),
  };
}

function wholeNumber(name: string, text: string, min: number, max: number): number {
  const number = /^\d+$/.test(text) ? Number(text) : Number.NaN;
  if (!(number >= min && number <= max)) {
    throw new ConfigError(
      `${name} must be a whole number from ${min} to ${max}, not ${JSON.stringify(text)}`,
    );
  }
  return number;
}

function oneOf<const T extends string>(name: string, text: string, allowed: readonly T[]): T {
  const found = allowed.find((candidate) => candidate === text);
  if (found === undefined) {
    throw new ConfigError(`${name} must be one of ${allowed.join(", ")}, not ${JSON.stringify(text)}`);
  }
  return found;
}
