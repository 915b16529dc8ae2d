import { htmlPage, PLAIN_STYLE } from "../presenters/html.ts";
import { type Route, route } from "../route.ts";

const EXAMPLE = "/v1/selections?mass=850kg&speed=1180rpm&feet=4&transmissibility=0.08";

const PAGE = htmlPage(
  "mountrank",
  `<h1>mountrank</h1>
<p>Give the weight and the running speed of a machine, and how much of its vibration may reach the floor. Back come
the vibration isolators that hold that target, ranked, each with its static deflection and natural frequency.</p>
<ul>
<li><a href="${EXAMPLE.replaceAll("&", "&amp;")}">An example</a>: a return fan of the Brackwater Bakery, 850 kg at 1180 rpm</li>
<li><a href="/reference">The reference</a>: every address and field</li>
<li><a href="/reference/problems">The problem codes</a></li>
</ul>`,
  PLAIN_STYLE,
);

export const pageRoutes: readonly Route[] = [
  route({
    method: "get",
    path: "/",
    access: "open",
    operation: {
      operationId: "getPage",
      summary: "Where to begin",
      description: "A page that says what the service does and leads to an example and to the reference.",
      tags: ["service"],
      responses: {
        200: { description: "The page.", content: { "text/html": { schema: { type: "string" } } } },
      },
    },
    handler({ response }) {
      response.type("html").send(PAGE);
    },
  }),
];
