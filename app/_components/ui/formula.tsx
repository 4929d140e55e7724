import katex from 'katex';
import 'katex/dist/katex.min.css';

/** A displayed formula. Only formulas of our own are set, never text that a user typed. */
export function Formula({ tex }: { tex: string }) {
  const html = katex.renderToString(tex, { displayMode: true, throwOnError: true, output: 'htmlAndMathml' });
  return <div className="formula" dangerouslySetInnerHTML={{ __html: html }} />;
}
