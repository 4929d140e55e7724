/** Why an outcome is what it is, with the study's own numbers, and what to do next. Norms are written L1, L2, L∞. */
export interface Explanation { sentence: string; nextStep: string }
