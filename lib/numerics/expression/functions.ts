import { erf } from './erf';

/** What the grammar knows: every function is smooth where it is defined and takes one argument. */
export const functions = {
  sin: Math.sin, cos: Math.cos, tan: Math.tan,
  sinh: Math.sinh, cosh: Math.cosh, tanh: Math.tanh,
  asin: Math.asin, acos: Math.acos, atan: Math.atan,
  exp: Math.exp, log: Math.log, sqrt: Math.sqrt, erf,
} as const satisfies Record<string, (value: number) => number>;

export type FunctionName = keyof typeof functions;

export const functionNames = Object.keys(functions) as FunctionName[];

export function isFunctionName(name: string): name is FunctionName {
  return Object.hasOwn(functions, name);
}

/** Functions that have a kink or a jump: an exact solution built from them has no order to verify. */
export const notSmooth: ReadonlySet<string> = new Set([
  'abs', 'sign', 'min', 'max', 'if', 'floor', 'ceil', 'round', 'mod', 'heaviside', 'step',
]);

/** What people write for a function that the grammar has under another name. */
export const otherSpelling: Readonly<Record<string, string>> = {
  ln: 'log(a)', log10: 'log(a)/log(10)', log2: 'log(a)/log(2)', pow: 'a^b', cbrt: 'a^(1/3)', arcsin: 'asin(a)',
  arccos: 'acos(a)', arctan: 'atan(a)', sec: '1/cos(a)', csc: '1/sin(a)', cot: '1/tan(a)', erfc: '1-erf(a)',
  diff: 'd(field, x)', dx: 'd(field, x)', sqr: 'a^2',
};
