/** A piece of drawing that is asked for often and done at most once a frame. */
export interface Framed {
  ask(): void;
  /** Draws at once what was asked for. */
  now(): void;
  /** Forgets what was asked for. */
  stop(): void;
}

/** Puts a drawing off to the next frame, however often it is asked for before. */
export function oncePerFrame(draw: () => void): Framed {
  let asked: number | undefined;
  function stop(): void {
    if (asked !== undefined) cancelAnimationFrame(asked);
    asked = undefined;
  }
  function now(): void {
    if (asked === undefined) return;
    stop();
    draw();
  }
  return {
    ask: () => void (asked ??= requestAnimationFrame(now)),
    now,
    stop,
  };
}
