/** A whole help page: one style, no script, nothing from elsewhere. */
export function pageFrame(title: string, body: string): string {
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>${pageText(title)}</title>
<style>
:root { color-scheme: light dark; }
body { font: 16px/1.5 system-ui, sans-serif; max-width: 48rem; margin: 24px auto; padding: 0 16px; }
code { font: 14px ui-monospace, monospace; overflow-wrap: anywhere; }
table { border-collapse: collapse; width: 100%; } th, td { text-align: left; vertical-align: top; padding: 4px 8px 4px 0; border-bottom: 1px solid #8886; }
article { margin-top: 40px; } .caution { border-left: 4px solid; padding-left: 12px; }
figure { margin: 12px 0; overflow-x: auto; } figcaption { font-size: 14px; } math { font-size: 18px; }
</style>
</head>
<body>
${body}
</body>
</html>
`;
}

/** Text as HTML, never taken for markup. */
export function pageText(raw: string): string {
  return raw.replace(/&/g, "&amp;").replace(/</g, "&lt;").replace(/>/g, "&gt;").replace(/"/g, "&quot;");
}
