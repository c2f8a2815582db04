// What the sheets use of fontkit beside what the charts do; the package ships no types.
declare module 'fontkit' {
  interface Font {
    glyphForCodePoint(codePoint: number): { readonly advanceWidth: number };
  }
}
