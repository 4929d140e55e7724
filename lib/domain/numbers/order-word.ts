const words = ['zeroth', 'first', 'second', 'third', 'fourth', 'fifth', 'sixth', 'seventh', 'eighth', 'ninth', 'tenth'];

/** An order as people say it: "second order", "order 1.5". */
export function orderWord(order: number): string {
  const word = words[order];
  return word ? `${word} order` : `order ${Number(order.toFixed(3))}`;
}
