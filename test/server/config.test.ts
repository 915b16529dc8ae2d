import { describe, expect, test } from "vitest";
import { ConfigError, readConfig } from "../../server/config.ts";

describe("configuration from the environment", () => {
  test("with nothing set, the service is for this machine only, on port 4080, in the folder data", () => {
    expect(readConfig({})).toEqual({
      host: "127.0.0.1",
      port: 4080,
      dataDir: "data",
      archiveLimit: 10_000,
      apiKeys: [],
      requireKey: "writing",
      logLevel: "warn",
    });
  });

  test("an empty variable counts as not set", () => {
    expect(readConfig({ PORT: "", HOST: " " })).toEqual(readConfig({}));
  });

  test("keys are separated by commas, and all routes can be made to ask for one", () => {
    const { apiKeys, requireKey } = readConfig({
      MOUNTRANK_API_KEYS: "flour, yeast,",
      MOUNTRANK_REQUIRE_KEY: "all",
    });
    expect(apiKeys).toEqual(["flour", "yeast"]);
    expect(requireKey).toBe("all");
  });

  test.each([
    ["PORT", "abc"],
    ["PORT", "65536"],
    ["PORT", "-1"],
    ["PORT", "40.5"],
    ["PORT", "0x10"],
    ["MOUNTRANK_ARCHIVE_LIMIT", "0"],
    ["MOUNTRANK_ARCHIVE_LIMIT", "many"],
    ["MOUNTRANK_REQUIRE_KEY", "some"],
    ["MOUNTRANK_REQUIRE_KEY", "all"],
    ["LOG_LEVEL", "loud"],
  ])("%s=%s is refused in one line that names the variable", (name, value) => {
    const read = () => readConfig({ [name]: value });
    expect(read).toThrow(ConfigError);
    expect(read).toThrow(new RegExp(`^${name} [^\\n]+$`));
  });
});
