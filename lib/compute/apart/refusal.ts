/** What a job refuses with more to say than a sentence: members of the problem document, plain data. */
export class Refusal extends RangeError {
  constructor(
    message: string,
    readonly members: Record<string, unknown>,
  ) {
    super(message);
  }
}
