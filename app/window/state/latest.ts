import type { BenchState } from './bench.svelte';

/**
 * Asks the same thing over and over: at most one question is under way and the newest waits. What was refused, lost or
 * asked of another bench is not heard of; the last question that was lost is asked again by whoever draws it.
 */
export class Latest<Question, Answer> {
  readonly #bench: BenchState;
  readonly #ask: (question: Question) => Promise<Answer | undefined>;
  readonly #heard: (answer: Answer, question: Question) => void;
  #next: { readonly question: Question } | undefined;
  #flying = false;

  constructor(
    bench: BenchState,
    ask: (question: Question) => Promise<Answer | undefined>,
    heard: (answer: Answer, question: Question) => void,
  ) {
    this.#bench = bench;
    this.#ask = ask;
    this.#heard = heard;
  }

  put(question: Question): void {
    this.#next = { question };
    if (!this.#flying) void this.#fly();
  }

  async #fly(): Promise<void> {
    this.#flying = true;
    while (this.#next) {
      const { question } = this.#next;
      this.#next = undefined;
      const { key } = this.#bench;
      const answer = await this.#ask(question);
      if (answer !== undefined && key === this.#bench.key) this.#heard(answer, question);
    }
    this.#flying = false;
  }
}
