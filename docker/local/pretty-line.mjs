const LEVELS = { 10: 'trace', 20: 'debug', 30: '', 40: 'WARN', 50: 'ERROR', 60: 'FATAL' };
// The console's prefix and its order say these already.
const LEFT_OUT = new Set(['level', 'time', 'process', 'pid', 'hostname', 'msg']);

/**
 * A line of the product's JSON log as a person reads it; any other line as it is.
 * @param {string} line @returns {string}
 */
export function prettyLine(line) {
  if (!line.startsWith('{')) return line;
  let record;
  try {
    record = JSON.parse(line);
  } catch {
    return line;
  }
  if (typeof record.level !== 'number') return line;
  const details = Object.entries(record)
    .filter(([key]) => !LEFT_OUT.has(key))
    .map(([key, value]) => `${key}=${typeof value === 'string' && !/\s/.test(value) ? value : JSON.stringify(value)}`);
  return [LEVELS[record.level] ?? '', record.msg ?? '', ...details].filter((part) => part !== '').join(' ');
}
