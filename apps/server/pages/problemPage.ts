import { type ProblemBody } from '../problems/problemBody';
import { html } from './html';
import { pageFrame } from './pageFrame';

/** What happened, what was kept, and the way on. */
export function problemPage({ title, detail, problems }: ProblemBody): string {
  const lines =
    problems.length === 0 ? [html`<p>${detail}</p>`] : problems.map(({ message }) => html`<p>${message}</p>`);
  return pageFrame({
    title: `Not done: ${title}`,
    language: 'en-GB',
    content: html`<main>
      <h1>That could not be done</h1>
      ${lines}
      <p>Nothing was changed.</p>
      <p><a href="/">To the evenings</a></p>
    </main>`,
  });
}
