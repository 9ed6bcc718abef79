const STYLE = `:root{color-scheme:light dark}
body{margin:0;padding:1.5rem;font:1.125rem/1.6 'Atkinson Hyperlegible Next',Verdana,sans-serif;background:light-dark(#fbf9f2,#07151c);color:light-dark(#0a1e28,#eef5f3)}
main{max-width:36rem;margin:0 auto}h1{font-size:1.5rem;line-height:1.3}
button{min-height:3.5rem;padding:0 1.5rem;font:inherit;font-weight:700;border:0;border-radius:.25rem;background:light-dark(#00405f,#92daf4);color:light-dark(#fff,#04131a)}
button:focus-visible{outline:3px solid light-dark(#8c0f5a,#ff9ed7);outline-offset:3px}`;

/**
 * A page that stands by itself, for people who are not signed in: a title, a text, and perhaps one button that
 * sends an empty form to the same address. All of it is written by us; nothing is escaped.
 */
export function plainPage({
  title,
  text,
  button,
}: {
  title: string;
  text: string;
  button?: string;
}): Response {
  const form = button ? `<form method="post"><button>${button}</button></form>` : '';
  const html = `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width">
<meta name="robots" content="noindex"><title>${title} · Wakewright</title><style>${STYLE}</style></head>
<body><main><h1>${title}</h1><p>${text}</p>${form}</main></body></html>`;
  return new Response(html, {
    headers: {
      'content-type': 'text/html; charset=utf-8',
      'cache-control': 'no-store',
      'referrer-policy': 'no-referrer',
      'content-security-policy':
        "default-src 'none'; style-src 'unsafe-inline'; form-action 'self'; frame-ancestors 'none'",
    },
  });
}
