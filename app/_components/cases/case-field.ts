import { isBlankGrid, isDeclared } from './case-definition';
import type { CaseValues } from './case-values';

/** The place in a list of the n-th item that is sent. */
function placeOf<Item>(items: readonly Item[] | undefined, isSent: (item: Item) => boolean, sent: number): number {
  const places = (items ?? []).flatMap((item, index) => (isSent(item) ? [index] : []));
  return places[sent] ?? sent;
}

/** The field of the form for a path of the definition, such as `fields.0.norms.1.tolerance`. */
export function caseField(path: string, values: CaseValues): string {
  const [list, at, part, inner, member] = path.split('.');
  if (list === 'fields' || list === 'quantities') {
    if (at === undefined) return `${list}.root`;
    if (part !== 'norms') return path;
    const norms = values.fields[Number(at)]?.norms;
    if (inner === undefined) return `fields.${at}.field`;
    const place = placeOf(norms, isDeclared, Number(inner));
    if (member === 'backing') return `fields.${at}.citation`;
    return `fields.${at}.norms.${place}.${member === 'expectExact' || member === undefined ? 'counts' : member === 'norm' ? 'formalOrder' : member}`;
  }
  if (list === 'gridPlan') {
    if (at === undefined) return 'gridPlan.root';
    const place = placeOf(values.gridPlan, (grid) => !isBlankGrid(grid), Number(at));
    return `gridPlan.${place}.${part === 'label' || part === 'dt' ? part : part === undefined ? 'label' : 'spacing'}`;
  }
  if (list === 'options') return 'options.root';
  if (list === 'requirements') return 'requirements';
  return path;
}
