import { html } from './html';

it('escapes what is put in, in text and in attributes', () => {
  const name = `<b a="1">'&`;
  expect(html`<p title="${name}">${name}</p>`.markup).toBe(
    '<p title="&lt;b a=&quot;1&quot;&gt;&#39;&amp;">&lt;b a=&quot;1&quot;&gt;&#39;&amp;</p>',
  );
});

it('puts pages together from pieces, and nothing where there is nothing', () => {
  const items = ['a', 'b'].map((text) => html`<li>${text}</li>`);
  expect(html`${items}${false}${null}${0}`.markup).toBe('<li>a</li><li>b</li>0');
});
