import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type { ServerResponse } from 'node:http';

/** Plain pages around sign-in: a white label on dark glass, without scripts. */

const find = createRequire(import.meta.url);
const font = (weight: 400 | 600): string => {
  const file = readFileSync(find.resolve(`@fontsource/ibm-plex-sans/files/ibm-plex-sans-latin-${String(weight)}-normal.woff2`));
  return `@font-face{font-family:Plex;font-weight:${String(weight)};src:url(data:font/woff2;base64,${file.toString('base64')}) format("woff2")}`;
};

const LOOK = `
:root{color-scheme:light;--bench:#E8ECE9;--paper:#FFFFFF;--tray:#F3F6F4;--ink:#14201B;--ink-2:#4A5852;--hair:#C9D2CD;--edge:#6F7E77;--bottle:#0E4A3A;--on-bottle:#FFFFFF;--stop:#9B1C2E;--glass:#12261F;--glass-ink:#E9F1ED;--glass-ink-2:#A5BCB1;--glass-hair:#38534A}
@media (prefers-color-scheme:dark){:root{color-scheme:dark;--bench:#0D1411;--paper:#151E1A;--tray:#1B2621;--ink:#E8EEEA;--ink-2:#A3B2AB;--hair:#2B3831;--edge:#788B82;--bottle:#6FC3A5;--on-bottle:#08160F;--stop:#F29AA3;--glass:#080D0B;--glass-ink:#E8EEEA;--glass-ink-2:#9DB0A7;--glass-hair:#2B3B34}}
*,*::before,*::after{box-sizing:border-box}
body{margin:0;min-height:100vh;background:var(--bench);color:var(--ink);font:400 15px/24px Plex,sans-serif}
h1,h2,p,ul{margin:0;padding:0}
header{background:var(--glass);color:var(--glass-ink);padding:0 24px 96px;border-bottom:1px solid var(--glass-hair)}
.mark{display:flex;align-items:center;gap:10px;height:44px;font-weight:600}
.mark svg{width:18px;height:22px;display:block}
main{width:min(560px,calc(100% - 32px));margin:-56px auto 48px;background:var(--paper);border:1px solid var(--hair);border-radius:3px;padding:32px}
h1{font-weight:600;font-size:24px;line-height:32px;letter-spacing:-.01em}
h1+p{margin-top:8px}
h2{font-weight:600;font-size:13px;line-height:20px;margin-top:24px;padding-bottom:4px;border-bottom:1px solid var(--hair)}
p{max-width:62ch;text-wrap:pretty}.quiet{color:var(--ink-2);font-size:13px;line-height:20px}
p+p,form,.act{margin-top:16px}
ul{list-style:none}
button,.button{font:600 15px/24px Plex,sans-serif;min-height:44px;padding:9px 16px;border-radius:3px;border:1px solid var(--bottle);background:var(--bottle);color:var(--on-bottle);cursor:pointer;text-decoration:none;display:inline-block}
button:hover,.button:hover{text-decoration:underline;text-underline-offset:3px}
.people button{display:grid;grid-template-columns:1fr auto;gap:2px 16px;width:100%;padding:8px 12px;background:transparent;color:var(--ink);border:0;border-bottom:1px solid var(--hair);border-radius:0;text-align:left}
.people button:hover{background:var(--tray);text-decoration:none}
.people .role{color:var(--ink-2);font-weight:400;font-size:13px}
.people form{margin:0}
label{display:block;font-weight:600;font-size:13px;line-height:20px;margin-bottom:4px}
label+input,label+select{margin-bottom:12px}
input,select{font:400 15px/24px Plex,sans-serif;width:100%;min-height:44px;padding:8px 12px;border:1px solid var(--edge);border-radius:3px;background:var(--paper);color:var(--ink)}
a{color:var(--bottle);text-underline-offset:3px}
.fault{color:var(--stop);font-weight:600;margin-top:16px}
:focus-visible{outline:2px solid var(--bottle);outline-offset:2px}
header :focus-visible{outline-color:var(--glass-ink)}
`;

let style: string | undefined;
/** The pages' one style sheet, with its fonts inside; read once. */
function pageStyle(): string {
  style ??= `${font(400)}${font(600)}${LOOK}`;
  return style;
}

const MARK =
  '<svg viewBox="0 0 18 22" fill="none" stroke="currentColor" stroke-width="1.5" aria-hidden="true"><path d="M1 1h16v20H1z"/><path d="M4 5.5h10M4 8.5h7.5M4 11.5h5.5"/><path d="M1 14.25h16" stroke-width="1"/><path d="M4 17.5h3M9.5 17.5h1.5"/></svg>';

/** @param body trusted markup; every value from outside goes through `escapeHtml` first */
export function renderPage(title: string, body: string): string {
  return `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width,initial-scale=1"><title>${escapeHtml(title)} · Colophon</title><style>${pageStyle()}</style></head><body><header><div class="mark">${MARK}<span>Colophon</span></div></header><main><h1>${escapeHtml(title)}</h1>${body}</main></body></html>`;
}

/** Sends such a page with a content policy that allows nothing but its own style. @param formTo where its forms may lead, as CSP sources */
export function sendPage(res: ServerResponse, status: number, html: string, formTo = "'self'"): void {
  const hash = createHash('sha256').update(pageStyle()).digest('base64');
  res.statusCode = status;
  res.setHeader('Content-Type', 'text/html; charset=utf-8');
  res.setHeader('Cache-Control', 'no-store');
  res.setHeader('X-Content-Type-Options', 'nosniff');
  // Under no-referrer a browser says null as the origin of a page's own form.
  // Not 'no-referrer': a browser then sends these forms with the origin "null", which nobody may trust.
  res.setHeader('Referrer-Policy', 'same-origin');
  res.setHeader('Content-Security-Policy', `default-src 'none'; style-src 'sha256-${hash}'; font-src data:; form-action ${formTo}; base-uri 'none'; frame-ancestors 'none'`);
  res.end(html);
}

export function escapeHtml(text: string): string {
  return text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;').replaceAll('"', '&quot;').replaceAll("'", '&#39;');
}
