import { tooManyRequests } from '../../errors.ts';

/** A browser opens six connections to one server; this is several browsers of one person, each at its limit. */
const STREAMS_PER_PERSON = 20;

/** How many streams each person has open in this process: each costs memory and work for as long as it stays. */
export class OpenStreams {
  readonly #counts = new Map<string, number>();

  /** Answers the function that gives the place back. */
  enter(personId: string): () => void {
    const count = this.#counts.get(personId) ?? 0;
    if (count >= STREAMS_PER_PERSON)
      throw tooManyRequests(`You follow ${count} runs at once already. Close some of their pages.`);
    this.#counts.set(personId, count + 1);
    return () => this.#leave(personId);
  }

  #leave(personId: string): void {
    const count = (this.#counts.get(personId) ?? 0) - 1;
    if (count > 0) this.#counts.set(personId, count);
    else this.#counts.delete(personId);
  }
}
