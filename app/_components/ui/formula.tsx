import katex from 'katex';
import 'katex/dist/katex.min.css';

/** Shorter ones never scroll, not even on a phone: they need no stop for the keyboard. */
const longestThatFits = 36;

/** A displayed formula. The TeX is always of our own making: what a user typed goes through the expression reader first. */
export function Formula({ tex }: { tex: string }) {
  const html = katex.renderToString(tex, { displayMode: true, throwOnError: true, output: 'htmlAndMathml' });
  const reach = tex.length > longestThatFits ? { tabIndex: 0, role: 'group', 'aria-label': 'Formula, scrolls sideways' } : {};
  return <div className="formula" {...reach} dangerouslySetInnerHTML={{ __html: html }} />;
}
