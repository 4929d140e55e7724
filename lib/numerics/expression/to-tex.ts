import { parseTree, type Tree } from './parse-tree';

const greek = new Set([
  'alpha', 'beta', 'gamma', 'delta', 'epsilon', 'zeta', 'eta', 'theta', 'iota', 'kappa', 'lambda', 'mu', 'nu', 'xi', 'pi', 'rho',
  'sigma', 'tau', 'upsilon', 'phi', 'chi', 'psi', 'omega', 'Gamma', 'Delta', 'Theta', 'Lambda', 'Xi', 'Pi', 'Sigma', 'Phi', 'Psi', 'Omega',
]);
const upright: Readonly<Record<string, string>> = { asin: '\\arcsin', acos: '\\arccos', atan: '\\arctan', log: '\\ln', erf: '\\operatorname{erf}' };
const strength = { sum: 1, product: 2, sign: 2, power: 4, whole: 5 } as const;

interface Set { tex: string; strength: number }

/**
 * An expression as TeX, as it was written: nothing is simplified, a division becomes a fraction, a power a superscript.
 * Throws an ExpressionProblem where the text is not in the grammar. Only letters, digits and signs of ours reach the TeX.
 */
export function expressionToTex(text: string): string {
  return setTree(parseTree(text)).tex;
}

/** A name as TeX: Greek letters by their names, what follows the first letter or an underscore as an index. */
export function nameToTex(name: string): string {
  const [head = '', ...rest] = name.split('_').filter(Boolean);
  const digits = /^([A-Za-z]+?)(\d+)$/.exec(head);
  const letters = digits?.[1] ?? head;
  const index = [digits?.[2], ...rest].filter((part) => part !== undefined && part !== '').join(',');
  const stem = greek.has(letters) ? `\\${letters}` : letters.length > 1 ? `\\mathit{${letters}}` : letters;
  return index === '' ? stem : `${stem}_{\\mathrm{${index}}}`;
}

function setTree(tree: Tree): Set {
  switch (tree.kind) {
    case 'leaf': return { tex: tree.token.kind === 'number' ? setNumber(tree.token.text) : nameToTex(tree.token.text), strength: strength.whole };
    case 'negate': return { tex: `-${bracketed(setTree(tree.part), strength.product)}`, strength: strength.sign };
    case 'call': return setCall(tree.token.text, tree.parts.map(setTree));
    case 'operation': return setOperation(tree.operator, setTree(tree.left), setTree(tree.right));
  }
}

function setNumber(text: string): string {
  const [mantissa = '', exponent] = text.toLowerCase().split('e');
  return exponent === undefined ? mantissa : `${mantissa}\\cdot 10^{${Number(exponent)}}`;
}

function setCall(name: string, parts: readonly Set[]): Set {
  const [first = { tex: '', strength: strength.whole }, by] = parts;
  if (name === 'sqrt') return { tex: `\\sqrt{${first.tex}}`, strength: strength.whole };
  if (name === 'exp') return { tex: `e^{${first.tex}}`, strength: strength.power };
  if (name === 'd' && by) return { tex: `\\frac{\\partial ${bracketed(first, strength.power)}}{\\partial ${by.tex}}`, strength: strength.product };
  return { tex: `${upright[name] ?? `\\${name}`}\\left(${first.tex}\\right)`, strength: strength.whole };
}

function setOperation(operator: string, left: Set, right: Set): Set {
  switch (operator) {
    case '+': return { tex: `${left.tex} + ${bracketed(right, strength.sum + (right.tex.startsWith('-') ? 1.5 : 0))}`, strength: strength.sum };
    case '-': return { tex: `${left.tex} - ${bracketed(right, strength.product + (right.tex.startsWith('-') ? 0.5 : 0))}`, strength: strength.sum };
    case '*': return { tex: setProduct(bracketed(left, strength.product), bracketed(right, strength.product + (right.tex.startsWith('-') ? 0.5 : 0))), strength: strength.product };
    case '/': return { tex: `\\frac{${left.tex}}{${right.tex}}`, strength: strength.product };
    default: return { tex: `${bracketed(left, strength.whole)}^{${right.tex}}`, strength: strength.power };
  }
}

/** Factors stand side by side with a thin space; a dot keeps two numbers apart. */
function setProduct(left: string, right: string): string {
  return `${left}${/^\d/.test(right) ? '\\cdot ' : '\\,'}${right}`;
}

function bracketed(set: Set, least: number): string {
  return set.strength < least ? `\\left(${set.tex}\\right)` : set.tex;
}
