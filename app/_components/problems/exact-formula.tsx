import { expressionToTex, nameToTex } from '@/lib/numerics/expression/to-tex';
import { ExpressionProblem } from '@/lib/numerics/expression/expression-problem';
import { Formula } from '../ui/formula';

function texOf(name: string, text: string, of: readonly string[]): string | null {
  try {
    return `${nameToTex(name)}${of.length > 0 ? `(${of.join(', ')})` : ''} = ${expressionToTex(text)}`;
  } catch (problem) {
    if (problem instanceof ExpressionProblem) return null;
    throw problem;
  }
}

interface ExactFormulaProps { name: string; text: string; of?: readonly string[] }

/** An expression typeset; nothing while it cannot be read. */
export function ExactFormula({ name, text, of = [] }: ExactFormulaProps) {
  if (text.trim() === '' || !/^[A-Za-z]\w*$/.test(name)) return null;
  const tex = texOf(name, text, of);
  return tex === null ? null : <Formula tex={tex} />;
}
