/**
 * The text of a field. It is the recipe's until the user types, and the user's until the engine has taken it: an answer
 * that comes late undoes no letter, and what a lost engine could not take stays.
 */
export class Draft {
  text = $state('');
  /** Whether the text cannot be read, or the engine refused it. */
  wrong = $state(false);
  readonly #settled: () => string;
  readonly #send: (text: string) => Promise<boolean> | undefined;
  #typed = false;
  #focused = false;
  /** What is under way to the engine. */
  #sent: string | undefined;

  /**
   * @param settled the text that the recipe has
   * @param send sends a text and tells whether it was taken; undefined for a text that cannot be read
   */
  constructor(settled: () => string, send: (text: string) => Promise<boolean> | undefined) {
    this.#settled = settled;
    this.#send = send;
    this.text = settled();
  }

  /** Shows what the recipe has, unless the text is the user's. */
  follow(): void {
    const settled = this.#settled();
    if (!this.#typed && !this.#focused) this.#show(settled);
  }

  focus(): void {
    this.#focused = true;
  }

  /** The field is left. */
  blur(): void {
    this.#focused = false;
    this.follow();
  }

  type(text: string): void {
    this.text = text;
    this.#typed = true;
  }

  /** Sends the text if it is not sent; false when it cannot be read. */
  commit(): boolean {
    if (!this.#typed || this.#sent === this.text) return true;
    if (this.text === this.#settled() && this.#sent === undefined) return (this.reset(), true);
    const text = this.text;
    const sending = this.#send(text);
    this.wrong = sending === undefined;
    if (!sending) return false;
    this.#sent = text;
    void sending.then((taken) => this.#answered(text, taken));
    return true;
  }

  /** Goes back to what the recipe has. */
  reset(): void {
    this.#typed = false;
    this.#sent = undefined;
    this.#show(this.#settled());
  }

  #answered(text: string, taken: boolean): void {
    if (this.text !== text || this.#sent !== text) return;
    this.#sent = undefined;
    this.wrong = !taken;
    if (!taken) return;
    this.#typed = false;
    if (!this.#focused) this.#show(this.#settled());
  }

  #show(text: string): void {
    this.text = text;
    this.wrong = false;
  }
}
