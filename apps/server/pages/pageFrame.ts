import { html, type Html } from './html';
import { STYLE_ADDRESS } from './style';

/** A whole page around its content. */
export function pageFrame(page: {
  readonly title: string;
  readonly language: string;
  readonly content: Html;
}): string {
  return html`<!doctype html>
    <html lang="${page.language}">
      <head>
        <meta charset="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <title>${page.title}</title>
        <link rel="stylesheet" href="${STYLE_ADDRESS}" />
        <link rel="icon" href="/icon.svg" type="image/svg+xml" />
      </head>
      <body>
        ${page.content}
      </body>
    </html> `.markup;
}
