const WITHOUT_SERVICES = new Set(['unit', 'checks']);

/**
 * Whether the tests asked for on the command line need a running product. What cannot be told needs one.
 * @param {string[]} args handed on to vitest @returns {boolean}
 */
export function needsProduct(args) {
  const projects = args.flatMap((arg, index) => {
    if (arg === '--project') return [args[index + 1] ?? ''];
    return arg.startsWith('--project=') ? [arg.slice('--project='.length)] : [];
  });
  if (projects.length > 0) return projects.some((project) => !WITHOUT_SERVICES.has(project));
  const files = args.filter((arg) => /^(\.\/)?tests\//.test(arg));
  if (files.length === 0) return true;
  return files.some((file) => !WITHOUT_SERVICES.has(file.replace(/^\.\//, '').split('/')[1] ?? ''));
}
