import { html, Markup } from './html.js';

export const TITLE = 'Mail that was caught';

export function layout(heading: string, body: Markup): string {
  const page = html`<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta name="color-scheme" content="light dark">
<title>${heading === TITLE ? TITLE : `${heading} - ${TITLE}`}</title>
<link rel="icon" href="data:,">
<link rel="stylesheet" href="/page.css">
<script src="/page.js" defer></script>
</head>
<body>
<header><a href="/">${TITLE}</a><span>For development and tests only. Nothing here was sent on.</span></header>
<main>
<p id="failure" role="alert" hidden></p>
${body}
</main>
</body>
</html>
`;
  return page.text;
}
