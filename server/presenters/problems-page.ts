import { PROBLEM_CODES, PROBLEMS } from "../problems.ts";
import { escapeHtml, htmlPage, PLAIN_STYLE } from "./html.ts";

/** The page that the `type` of every problem leads to: code, meaning and cure, from the registry. */
export function problemsPage(): string {
  const rows = PROBLEM_CODES.map((code) => {
    const { status, title, meaning, cure } = PROBLEMS[code];
    return `<tr id="${code}"><th scope="row"><code>${code}</code></th><td>${status}</td>
<td>${escapeHtml(title)}. ${escapeHtml(meaning)}</td><td>${escapeHtml(cure)}</td></tr>`;
  });
  return htmlPage(
    "mountrank problems",
    `<h1>Problems</h1>
<p>Every error answer has the media type <code>application/problem+json</code> (RFC 9457) and one of these codes.
Its <code>errors</code> point at the fields at fault. See also the <a href="/reference">reference</a>.</p>
<table>
<thead><tr><th scope="col">Code</th><th scope="col">Status</th><th scope="col">Meaning</th><th scope="col">Cure</th></tr></thead>
<tbody>
${rows.join("\n")}
</tbody>
</table>`,
    PLAIN_STYLE,
  );
}
