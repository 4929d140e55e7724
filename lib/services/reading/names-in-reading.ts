/** What columns that no field is called by are named in a reading: a derivative, and the square that a factor is made of. */
export const derivativeName = (field: string, axis: string) => `d(${field}, ${axis})`;
export const squareName = (field: string) => `${field} squared`;
