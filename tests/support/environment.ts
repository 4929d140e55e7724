/** A variable that the test run sets for the running product. */
export function need(name: string): string {
  const value = process.env[name];
  if (!value) throw new Error(`${name} is not set: run these tests by npm test.`);
  return value;
}
