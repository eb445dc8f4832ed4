/**
 * Makes a question that may be asked at any rate: one is under way at a time, and when it was asked again meanwhile, it is
 * asked once more at the end. `undefined` answers (refused, lost) are passed over.
 */
export function latest<Params, Result>(
  ask: (params: Params) => Promise<Result | undefined>,
  take: (result: Result) => void,
): (params: Params) => void {
  let next: { params: Params } | undefined;
  let busy = false;
  async function run(): Promise<void> {
    busy = true;
    while (next) {
      const { params } = next;
      next = undefined;
      const result = await ask(params);
      if (result !== undefined) take(result);
    }
    busy = false;
  }
  return (params) => {
    next = { params };
    if (!busy) void run();
  };
}
