/**
 * A question one room asks and another, which builds on it, answers: the answering room hands its
 * function over at start, so that imports keep running one way.
 */
export abstract class Supplied<Args extends unknown[], Answer> {
  private supplier: ((...args: Args) => Promise<Answer>) | null = null;

  /** What is answered while nobody has taken the question. */
  protected abstract readonly unanswered: Answer;

  supply(supplier: (...args: Args) => Promise<Answer>): void {
    this.supplier = supplier;
  }

  async ask(...args: Args): Promise<Answer> {
    return this.supplier ? this.supplier(...args) : this.unanswered;
  }
}
