import { ZodError } from "zod";
import { type Fault, InputError } from "../src/errors/index.ts";
import { faultsOf } from "./input/faults.ts";

interface ProblemKind {
  readonly status: number;
  readonly title: string;
  readonly meaning: string;
  readonly cure: string;
}

/**
 * Every kind of problem the service answers with. The reference page and the OpenAPI document are made from
 * this table. A code that is given up stays listed and is never used for something else.
 */
export const PROBLEMS = {
  "malformed-request": {
    status: 400,
    title: "The request cannot be read",
    meaning: "The address holds a broken percent-encoding, or the body ended before its stated length.",
    cure: "Encode the address as UTF-8 percent-encoding; a part number may hold any sign once it is encoded.",
  },
  "malformed-json": {
    status: 400,
    title: "The body is not JSON",
    meaning: "The body is empty or breaks the grammar of JSON. NaN and Infinity are not JSON.",
    cure: "Check the body with any JSON tool; the detail says where reading stopped.",
  },
  unauthorized: {
    status: 401,
    title: "A key is needed",
    meaning: "This service asks for a key here, and the request had none or one that is not known.",
    cure: "Send Authorization: Bearer <key>, or key=<key> in the query of a spreadsheet address.",
  },
  "not-found": {
    status: 404,
    title: "There is no such thing",
    meaning: "The address is of a kind the service knows, but nothing is kept under this name.",
    cure: "Look the name up in the list it came from. Old selections make room for new ones.",
  },
  "unknown-route": {
    status: 404,
    title: "There is no such address",
    meaning: "The service has nothing at this path.",
    cure: "All addresses are listed under /reference.",
  },
  "method-not-allowed": {
    status: 405,
    title: "The method does not fit the address",
    meaning: "The path exists, but not with this method.",
    cure: "Use one of the methods in the Allow header.",
  },
  "not-acceptable": {
    status: 406,
    title: "The answer has no such form",
    meaning: "None of the media types in the Accept header is offered here.",
    cure: "Leave Accept out for JSON, or choose a form that the reference lists for this address.",
  },
  "stale-cursor": {
    status: 410,
    title: "The list has changed since this cursor was made",
    meaning: "A cursor holds for one catalogue revision and one query.",
    cure: "Start again from the first page, without a cursor.",
  },
  "payload-too-large": {
    status: 413,
    title: "The body is too large",
    meaning: "The body, once unpacked, is larger than this address takes.",
    cure: "Send less at once. The limit is 1 MiB unless the reference says more.",
  },
  "unsupported-media-type": {
    status: 415,
    title: "The body is of a kind that is not read here",
    meaning: "The Content-Type, its charset or the Content-Encoding is not one this address reads.",
    cure: "Send Content-Type: application/json, in UTF-8.",
  },
  "invalid-input": {
    status: 422,
    title: "The input cannot be used",
    meaning:
      "The request is well formed, but a field is missing, unknown, of the wrong kind or outside its range.",
    cure: "Each entry of errors points at a field and says what is wrong with it.",
  },
  internal: {
    status: 500,
    title: "The service failed",
    meaning: "Something went wrong that is not the request's fault.",
    cure: "Tell whoever runs the service the request_id: the log holds the cause under it.",
  },
  unavailable: {
    status: 503,
    title: "The service cannot answer now",
    meaning: "The catalogue cannot be read, or the service is busy or stopping.",
    cure: "Try again after the time in the Retry-After header.",
  },
} as const satisfies Record<string, ProblemKind>;

export type ProblemCode = keyof typeof PROBLEMS;

/** The codes in the order of the table. */
export const PROBLEM_CODES = Object.keys(PROBLEMS) as readonly ProblemCode[];

/** A fault of the input; `parameter` names the query or path parameter where there is one. */
export interface InputFault extends Fault {
  readonly parameter?: string;
}

interface ProblemExtra {
  readonly errors?: readonly InputFault[];
  readonly headers?: Readonly<Record<string, string>>;
}

/**
 * A problem that the edge itself finds. Its `detail` is shown to the caller, so it must say nothing about the
 * inside. It is not for rules of the model: those are `InputError`.
 */
export class ProblemError extends Error {
  override readonly name = "ProblemError";
  readonly code: ProblemCode;
  readonly errors: readonly InputFault[] | undefined;
  readonly headers: Readonly<Record<string, string>>;

  constructor(code: ProblemCode, detail: string, extra: ProblemExtra = {}) {
    super(detail);
    this.code = code;
    this.errors = extra.errors;
    this.headers = extra.headers ?? {};
  }

  get status(): number {
    return PROBLEMS[this.code].status;
  }
}

/** More faults than this are counted, not listed. */
const FAULTS_SHOWN = 50;

/** A problem with the input, from every fault that was found. */
export function invalidInput(faults: readonly InputFault[]): ProblemError {
  const [first] = faults;
  if (first === undefined) return new ProblemError("invalid-input", "The input cannot be used.");
  const place = first.parameter ?? (first.pointer === "" ? "the request" : first.pointer);
  const rest = faults.length === 1 ? "" : ` (and ${faults.length - 1} more)`;
  return new ProblemError("invalid-input", `${place}: ${first.detail}${rest}`, {
    errors: faults.slice(0, FAULTS_SHOWN),
  });
}

/** What `express.json` calls its failures, and what they are here. */
const BODY_FAILURES: Readonly<Record<string, ProblemCode>> = {
  "entity.parse.failed": "malformed-json",
  "entity.empty": "malformed-json",
  "entity.too.large": "payload-too-large",
  "charset.unsupported": "unsupported-media-type",
  "encoding.unsupported": "unsupported-media-type",
};

/**
 * The problem to answer with when `error` was thrown. Only what is registered here says what happened;
 * anything else is `internal` and says nothing.
 */
export function problemOf(error: unknown): ProblemError {
  if (error instanceof ProblemError) return error;
  if (error instanceof InputError) return invalidInput(error.faults);
  if (error instanceof ZodError) return invalidInput(faultsOf(error));
  // Express and its body reader mark what the caller did wrong with a 4xx status.
  if (error instanceof Error && "status" in error && typeof error.status === "number") {
    const type = "type" in error && typeof error.type === "string" ? error.type : "";
    const code = BODY_FAILURES[type];
    if (code !== undefined) return new ProblemError(code, error.message);
    if (error.status >= 400 && error.status < 500)
      return new ProblemError("malformed-request", error.message);
  }
  return new ProblemError("internal", "The service failed. Its log holds the cause under the request id.");
}

/** The body of a problem answer. */
export function problemBody(problem: ProblemError, instance: string, requestId: string) {
  const { status, title } = PROBLEMS[problem.code];
  return {
    type: `/reference/problems#${problem.code}`,
    title,
    status,
    detail: problem.message,
    instance,
    code: problem.code,
    ...(problem.errors === undefined ? {} : { errors: problem.errors }),
    request_id: requestId,
  };
}
