const STYLE = `body{font:16px/1.5 system-ui,sans-serif;max-width:60rem;margin:2rem auto;padding:0 1rem;color-scheme:light dark}
table{border-collapse:collapse;width:100%}td,th{text-align:left;padding:.4rem .6rem;border-bottom:1px solid #8886}
pre{white-space:pre-wrap;font:inherit}iframe{width:100%;height:30rem;border:1px solid #8886;background:#fff}`;

export function escapeHtml(text: string): string {
  return text.replace(/[&<>"']/g, (character) => `&#${character.charCodeAt(0)};`);
}

/** A page of one of the fakes; the body is HTML, the title is text. */
export function page(title: string, body: string): string {
  return `<!doctype html><html lang="en"><meta charset="utf-8"><meta name="viewport" content="width=device-width"><link rel="icon" href="data:,"><title>${escapeHtml(title)}</title><style>${STYLE}</style><body><h1>${escapeHtml(title)}</h1>${body}</body></html>`;
}
