const words = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten', 'eleven', 'twelve'];

/** A count in a sentence: in words up to twelve, in digits above. */
export function countWord(count: number): string {
  return words[count] ?? String(count);
}
