import type { Node } from './node';

/** Every node that the given ones are made of, each once, operands before what uses them. */
export function listNodes(roots: readonly Node[]): Node[] {
  const seen = new Set<Node>();
  const waiting = [...roots];
  for (let node = waiting.pop(); node !== undefined; node = waiting.pop()) {
    if (seen.has(node)) continue;
    seen.add(node);
    if (node.kind === 'unary') waiting.push(node.a);
    if (node.kind === 'binary') waiting.push(node.a, node.b);
  }
  return [...seen].sort((a, b) => a.id - b.id);
}
