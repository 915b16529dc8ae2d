import { z } from "zod";
import { ProblemError } from "../problems.ts";
import { type Route, route } from "../route.ts";

const HealthSchema = z.looseObject({ status: z.literal("ok") }).meta({ id: "Health" });

const answer = (description: string) => ({
  200: { description, content: { "application/json": { schema: HealthSchema, example: { status: "ok" } } } },
});

export const healthRoutes: readonly Route[] = [
  route({
    method: "get",
    path: "/health/live",
    access: "open",
    operation: {
      operationId: "getLiveness",
      summary: "Is the process alive?",
      description: "Answers as long as the process takes requests. It looks at nothing else.",
      tags: ["service"],
      responses: answer("The process is alive."),
    },
    handler({ response }) {
      response.set("cache-control", "no-store").json({ status: "ok" });
    },
  }),
  route({
    method: "get",
    path: "/health/ready",
    access: "open",
    operation: {
      operationId: "getReadiness",
      summary: "Can it serve selections?",
      description: "Looks at the catalogue and the archive; 503 when they cannot be read.",
      tags: ["service"],
      responses: answer("Selections can be served."),
      problems: ["unavailable"],
    },
    handler({ context, response }) {
      try {
        context.store.check();
      } catch (error) {
        context.logger.error({ err: error }, "the catalogue cannot be read");
        throw new ProblemError("unavailable", "The catalogue cannot be read.", {
          headers: { "retry-after": "5" },
        });
      }
      response.set("cache-control", "no-store").json({ status: "ok" });
    },
  }),
];
