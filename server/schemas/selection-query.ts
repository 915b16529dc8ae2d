import { z } from "zod";
import { InputError } from "../../src/errors/index.ts";

/**
 * The query names of a selection, each with the place in the body that it fills and how its text is read.
 * A quantity goes through as text; the body's schema reads it.
 */
const QUERY = {
  name: { to: ["name"], as: "text", description: "What you call the machine." },
  tag: { to: ["tag"], as: "text", description: "Its number in your list." },
  mass: {
    to: ["mass"],
    as: "quantity",
    description: "Mass on the isolators, kg or with a unit.",
    example: "850kg",
  },
  speed: {
    to: ["speed"],
    as: "quantity",
    description: "Running speed, rpm or with a unit.",
    example: "1180rpm",
  },
  speed_min: { to: ["speed", "min"], as: "quantity", description: "Lowest speed of a range." },
  speed_max: { to: ["speed", "max"], as: "quantity", description: "Highest speed of a range." },
  feet: { to: ["feet"], as: "number", description: "Number of feet; 4 when left out.", example: "4" },
  length: { to: ["feet", "length"], as: "quantity", description: "Length of the footprint along x." },
  width: { to: ["feet", "width"], as: "quantity", description: "Width of the footprint along y." },
  cg_x: { to: ["centre_of_gravity", "x"], as: "quantity", description: "Centre of gravity along x." },
  cg_y: { to: ["centre_of_gravity", "y"], as: "quantity", description: "Centre of gravity along y." },
  cg_z: { to: ["centre_of_gravity", "z"], as: "quantity", description: "Centre of gravity above the feet." },
  rotor_mass: { to: ["excitation", "0", "rotor_mass"], as: "quantity", description: "Mass of the rotor." },
  grade: {
    to: ["excitation", "0", "grade"],
    as: "text",
    description: "ISO 21940-11 balance grade.",
    example: "G6.3",
  },
  force: {
    to: ["excitation", "0", "amplitude"],
    as: "quantity",
    description: "Vertical force once per revolution.",
  },
  transmissibility: {
    to: ["target", "transmissibility"],
    as: "number",
    description: "Target.",
    example: "0.08",
  },
  efficiency: { to: ["target", "isolation_efficiency"], as: "number", description: "Target, per cent." },
  max_force: { to: ["target", "transmitted_force"], as: "quantity", description: "Target, zero to peak." },
  families: { to: ["limits", "families"], as: "list", description: "Families allowed, comma-separated." },
  max_price: {
    to: ["limits", "price"],
    as: "number",
    description: "Highest price of all isolators together.",
  },
  max_height: { to: ["limits", "free_height"], as: "quantity", description: "Highest free height." },
  captive: { to: ["environment", "captive"], as: "boolean", description: "Only captive isolators." },
  temp_min: {
    to: ["environment", "temperature", "min"],
    as: "quantity",
    description: "Lowest temperature, °C.",
  },
  temp_max: {
    to: ["environment", "temperature", "max"],
    as: "quantity",
    description: "Highest temperature, °C.",
  },
  mounting: { to: ["mounting"], as: "text", description: "floor or suspended." },
  rank_by: { to: ["rank_by"], as: "text", description: "Order of ranking." },
  catalog: { to: ["catalog"], as: "text", description: "Catalogue to choose from." },
  limit: { to: ["limit"], as: "number", description: "Options on a page." },
  cursor: { to: ["cursor"], as: "text", description: "next_cursor of the page before." },
} as const satisfies Record<string, QueryField>;

interface QueryField {
  readonly to: readonly string[];
  readonly as: "text" | "quantity" | "number" | "list" | "boolean";
  readonly description: string;
  readonly example?: string;
}

const FIELDS: readonly (readonly [string, QueryField])[] = Object.entries(QUERY);

/** Keys of `excitation/0` that the query implies, by the name that brings it. */
const KIND: Readonly<Record<string, string>> = {
  rotor_mass: "unbalance",
  grade: "unbalance",
  force: "force",
};

/** The query of a GET selection: all text; what it means is checked where the body is. */
export const SelectionQuery = z.strictObject(
  Object.fromEntries(FIELDS.map(([name, field]) => [name, textField(field)])) as {
    [Name in keyof typeof QUERY]: ReturnType<typeof textField>;
  },
);

function textField({ description, example }: QueryField) {
  return z
    .string()
    .max(200)
    .optional()
    .meta({ description, ...(example === undefined ? {} : { examples: [example] }) });
}

type Nested = { [key: string]: Nested | unknown };

/**
 * The body that a query stands for. Numbers and booleans are read here, quantities by the body's schema.
 * @throws {InputError} a name given with another that excludes it
 */
export function bodyOfQuery(query: Readonly<Record<string, string | undefined>>): unknown {
  requireCompatible(query);
  const body: Nested = {};
  for (const [name, { to, as }] of FIELDS) {
    const text = query[name];
    if (text === undefined || text === "") continue;
    put(body, name === "feet" && footprint(query) ? ["feet", "count"] : to, read(text, as));
    const kind = KIND[name];
    if (kind !== undefined) put(body, ["excitation", "0", "kind"], kind);
  }
  if (body["excitation"] !== undefined) body["excitation"] = [(body["excitation"] as Nested)["0"]];
  if (footprint(query)) put(body, ["feet", "count"], (body["feet"] as Nested)["count"] ?? 4);
  const cg = body["centre_of_gravity"] as Nested | undefined;
  if (cg) body["centre_of_gravity"] = { x: 0, y: 0, ...cg };
  return body;
}

/** The query name that filled a place of the body, for telling a caller which of his names is at fault. */
export function queryNameOf(pointer: string): string | undefined {
  const path = pointer.split("/").slice(1);
  const matches = (to: readonly string[]): boolean => path.every((key, i) => to[i] === key);
  if (pointer === "/feet/count") return "feet";
  return (
    FIELDS.find(([, { to }]) => to.length === path.length && matches(to))?.[0] ??
    FIELDS.find(([, { to }]) => matches(to))?.[0]
  );
}

function footprint(query: Readonly<Record<string, string | undefined>>): boolean {
  return query["length"] !== undefined || query["width"] !== undefined;
}

function requireCompatible(query: Readonly<Record<string, string | undefined>>): void {
  const refuse = (name: keyof typeof QUERY, other: string): void => {
    if (query[name] !== undefined && query[other] !== undefined)
      throw InputError.at(`/${QUERY[name].to.join("/")}`, `cannot stand beside ${other}`);
  };
  refuse("speed", "speed_min");
  refuse("speed", "speed_max");
  refuse("force", "rotor_mass");
  refuse("force", "grade");
}

/** Text that is no number stays text, for the body's schema to refuse in its own words. */
function read(text: string, as: QueryField["as"]): unknown {
  switch (as) {
    case "number": {
      const value = Number(text);
      return text.trim() === "" || Number.isNaN(value) ? text : value;
    }
    case "list":
      return text.split(",").map((entry) => entry.trim());
    case "boolean":
      return text === "true" || text === "1" ? true : text === "false" || text === "0" ? false : text;
    default:
      return text;
  }
}

function put(body: Nested, to: readonly string[], value: unknown): void {
  const [key, ...rest] = to as [string, ...string[]];
  if (rest.length === 0) body[key] = value;
  else {
    if (typeof body[key] !== "object") body[key] = {};
    put(body[key] as Nested, rest, value);
  }
}
