/** Text made safe inside an HTML element or a quoted attribute. */
export function escapeHtml(text: string): string {
  return text
    .replaceAll("&", "&amp;")
    .replaceAll("<", "&lt;")
    .replaceAll(">", "&gt;")
    .replaceAll('"', "&quot;")
    .replaceAll("'", "&#39;");
}

/** A whole plain page in English. `title` is text; `body` is HTML. */
export function htmlPage(title: string, body: string, head = ""): string {
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>${escapeHtml(title)}</title>
<link rel="icon" type="image/png" href="/reference/assets/favicon-32x32.png">
${head}</head>
<body>
${body}
</body>
</html>
`;
}

/** Style of the plain pages: readable measure, lines between table rows, the reader's own light or dark. */
export const PLAIN_STYLE = `<style>
:root { color-scheme: light dark; font: 1rem/1.5 system-ui, sans-serif; }
body { max-width: 60rem; margin: 2rem auto; padding: 0 1rem; }
table { border-collapse: collapse; }
th, td { text-align: left; vertical-align: top; padding: 0.4rem 0.8rem 0.4rem 0; border-bottom: 1px solid; }
th code { white-space: nowrap; }
</style>
`;
