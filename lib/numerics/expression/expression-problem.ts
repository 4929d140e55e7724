/** What is wrong with an expression, and where: `position` counts characters from 1. */
export class ExpressionProblem extends Error {
  constructor(readonly position: number, message: string) {
    super(message);
    this.name = 'ExpressionProblem';
  }
}
