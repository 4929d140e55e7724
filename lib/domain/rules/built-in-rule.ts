/**
 * The acceptance rule every organisation has: the defaults of the outcome rule. Four grids, because with three the
 * rule wrongly fails or passes too often (see the operating characteristic in the checks).
 */
export const builtInRule = { revision: 1, minimumGrids: 4, procedure: 'three-grid' } as const;
