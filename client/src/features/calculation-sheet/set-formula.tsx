import katex from 'katex';
import 'katex/dist/katex.min.css';

/** The TeX comes from our own formulas; `trust` is off, so nothing in it can name an address or a class. */
export default function SetFormula({ tex }: { readonly tex: string }) {
  const html = katex.renderToString(tex, { throwOnError: false, strict: 'ignore', trust: false });
  return <span dangerouslySetInnerHTML={{ __html: html }} />;
}
