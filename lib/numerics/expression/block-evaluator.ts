import type { ColumnEngine } from '../column-engine';
import type { Node, Variable } from './node';
import { listNodes } from './list-nodes';
import { evaluateBinary } from './evaluate-binary';
import { evaluateUnary } from './evaluate-unary';

/** A column of at least as many rows as are evaluated, or one value for all rows. */
export type VariableValues = Partial<Record<Variable, Float64Array | number>>;
type Column = { values: Float64Array };

/**
 * Prepares nodes for evaluation over up to `capacity` rows at a time. What the nodes share is computed once. The columns
 * returned, in the order of `nodes`, belong to the evaluator and hold until the next call, which allocates nothing.
 *
 * An engine does the steps that it knows, in columns of its own memory.
 *
 * A point where an expression is not defined gives NaN or an infinity there, for the caller to report with its row.
 */
export function createBlockEvaluator(
  nodes: readonly Node[], capacity = 2048, engine: ColumnEngine | null = null,
): (rows: number, variables: VariableValues) => readonly Float64Array[] {
  const used = listNodes(nodes);
  const columns = new Map<Node, Column>();
  const lastUse = findLastUses(used, nodes);
  const free: Float64Array[] = [];
  const allocate = () => engine?.allocate(capacity) ?? new Float64Array(capacity);
  const steps: ((rows: number) => void)[] = [];
  const bound: { name: Variable; column: Column; own: Float64Array }[] = [];

  for (const [index, node] of used.entries()) {
    const values = node.kind === 'unary' || node.kind === 'binary' ? free.pop() ?? allocate() : allocate();
    const column = { values };
    columns.set(node, column);
    if (node.kind === 'number') values.fill(node.value);
    else if (node.kind === 'variable') bound.push({ name: node.name, column, own: values });
    else steps.push(makeStep(node, column, columns, engine));
    for (const done of lastUse.get(index) ?? []) free.push(columnOf(columns, done).values);
  }
  const results = nodes.map((node) => columnOf(columns, node));
  const answer: Float64Array[] = results.map((column) => column.values);

  return (rows, variables) => {
    if (rows > capacity) throw new RangeError(`createBlockEvaluator: ${rows} rows were given, ${capacity} prepared`);
    for (const { name, column, own } of bound) column.values = bind(name, variables[name], own, rows);
    for (const step of steps) step(rows);
    for (let i = 0; i < results.length; i += 1) answer[i] = (results[i] as Column).values;
    return answer;
  };
}

function bind(name: Variable, given: Float64Array | number | undefined, own: Float64Array, rows: number): Float64Array {
  if (given === undefined) throw new TypeError(`createBlockEvaluator: no values were given for ${name}`);
  return typeof given === 'number' ? own.fill(given, 0, rows) : given;
}

function columnOf(columns: Map<Node, Column>, node: Node): Column {
  const column = columns.get(node);
  if (column === undefined) throw new Error(`createBlockEvaluator: node ${node.id} has no column`);
  return column;
}

/** Which intermediate columns are free for others after which step: results, numbers and variables never are. */
function findLastUses(used: readonly Node[], results: readonly Node[]): Map<number, Node[]> {
  const last = new Map<Node, number>();
  for (const [index, node] of used.entries()) {
    if (node.kind === 'unary') last.set(node.a, index);
    if (node.kind === 'binary') last.set(node.a, index).set(node.b, index);
  }
  const free = new Map<number, Node[]>();
  for (const [node, index] of last) {
    if (node.kind === 'number' || node.kind === 'variable' || results.includes(node)) continue;
    free.set(index, [...free.get(index) ?? [], node]);
  }
  return free;
}

function makeStep(
  node: Extract<Node, { kind: 'unary' | 'binary' }>, to: Column, columns: Map<Node, Column>, engine: ColumnEngine | null,
): (rows: number) => void {
  const a = columnOf(columns, node.a);
  if (node.kind === 'binary') {
    const b = columnOf(columns, node.b);
    const aNumber = node.a.kind === 'number' ? node.a.value : null;
    const bNumber = node.b.kind === 'number' ? node.b.value : null;
    return (rows) => {
      const operands = { a: a.values, b: b.values, aNumber, bNumber };
      if (engine?.binary(node.operation, operands, to.values, rows) !== true) evaluateBinary(node.operation, operands, to.values, rows);
    };
  }
  return (rows) => {
    if (engine?.unary(node.operation, a.values, to.values, rows) !== true) evaluateUnary(node.operation, a.values, to.values, rows);
  };
}
