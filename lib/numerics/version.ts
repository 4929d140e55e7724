/** Version of everything in this folder; kept with each assessment. Raise it with any change that can change a number. */
export const numericsVersion = '1.14.0';
