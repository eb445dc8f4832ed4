import { type EngineLink, LostError, type Packet, RefusedError } from '../../contract/link';
import type { EventName, Events, RequestName, Requests } from '../../contract/messages';

interface Waiting {
  readonly resolve: (result: never) => void;
  readonly reject: (error: unknown) => void;
}

/** The part of a link that is the same for every transport: matches answers to questions and hands events on. */
export class PendingAsks implements EngineLink {
  readonly #send: (packet: Packet) => void;
  readonly #waiting = new Map<number, Waiting>();
  readonly #listeners = new Map<EventName, Set<(data: never) => void>>();
  readonly #watchers = new Set<(connected: boolean) => void>();
  #next = 1;

  constructor(send: (packet: Packet) => void) {
    this.#send = send;
  }

  ask<Name extends RequestName>(name: Name, params: Requests[Name]['params']): Promise<Requests[Name]['result']> {
    return new Promise((resolve, reject) => {
      const id = this.#next++;
      this.#waiting.set(id, { resolve, reject });
      this.#send({ type: 'ask', id, name, params });
    });
  }

  listen<Name extends EventName>(name: Name, heard: (data: Events[Name]) => void): () => void {
    const listeners = this.#listeners.get(name) ?? new Set();
    this.#listeners.set(name, listeners);
    listeners.add(heard);
    return () => listeners.delete(heard);
  }

  onState(heard: (connected: boolean) => void): () => void {
    this.#watchers.add(heard);
    return () => this.#watchers.delete(heard);
  }

  /** Takes a packet that came from the engine. */
  take(packet: Packet): void {
    if (packet.type === 'event') {
      this.#listeners.get(packet.name)?.forEach((heard) => heard(packet.data as never));
      return;
    }
    if (packet.type === 'ask') return;
    const asked = this.#waiting.get(packet.id);
    this.#waiting.delete(packet.id);
    if (packet.type === 'answer') asked?.resolve(packet.result as never);
    else asked?.reject(new RefusedError(packet.problems));
  }

  /** Says that the engine is there or gone; what was asked of a lost one is rejected. */
  tell(connected: boolean): void {
    if (!connected) {
      for (const asked of this.#waiting.values()) asked.reject(new LostError('the engine is gone'));
      this.#waiting.clear();
    }
    this.#watchers.forEach((heard) => heard(connected));
  }
}
