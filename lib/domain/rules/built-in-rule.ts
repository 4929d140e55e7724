/**
 * The acceptance rule every organisation has: the defaults of the outcome rule. Four grids, because with three the
 * rule wrongly fails or passes too often (see the operating characteristic in the checks); a quantity without a known
 * value is judged from three on, as the GCI procedure has it.
 */
export const builtInRule = { revision: 1, minimumGrids: 4, minimumGridsOfQuantity: 3 } as const;
