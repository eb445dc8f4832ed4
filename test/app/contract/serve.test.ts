import { expect, it, vi } from 'vitest';
import type { Packet } from '../../../app/contract/link';
import { seatWindow, type Served } from '../../../app/contract/serve';
import { ProblemError } from '../../../core/table/problem';

function seated(handle: (name: string) => Promise<unknown>) {
  const [sent, bugs]: [Packet[], unknown[]] = [[], []];
  let tell: (name: never, data: never) => void = () => undefined;
  const left = vi.fn();
  const engine = {
    handle: vi.fn(handle),
    listen(heard: typeof tell) {
      tell = heard;
      return left;
    },
  };
  const seat = seatWindow(
    engine as unknown as Served,
    (packet) => sent.push(packet),
    (bug) => bugs.push(bug),
  );
  return { engine, sent, bugs, seat, left, tell: (name: string, data: unknown) => tell(name as never, data as never) };
}

it.each([
  [null],
  [undefined],
  ['ask'],
  [7],
  [[]],
  [{ type: 'event', name: 'bench', data: {} }],
  [{ type: 'ask', name: 'bench.view', params: {} }],
  [{ type: 'ask', id: '1', name: 'bench.view', params: {} }],
  [{ type: 'ask', id: 1, name: { toString: 1 }, params: {} }],
])('%j is no question: it does not reach the engine and gets no answer', (packet) => {
  const { seat, engine, sent } = seated(() => Promise.resolve(1));
  expect(seat.take(packet)).toBe(false);
  expect(engine.handle).not.toHaveBeenCalled();
  expect(sent).toEqual([]);
});

it.each([
  ['sources.eat', {}],
  ['toString', {}],
  ['__proto__', {}],
  ['bench.view', undefined],
  ['bench.view', null],
  ['bench.view', 'text'],
])('the question %s with %j is refused before it reaches the engine', (name, params) => {
  const { seat, engine, sent } = seated(() => Promise.resolve(1));
  expect(seat.take({ type: 'ask', id: 4, name, params })).toBe(true);
  expect(engine.handle).not.toHaveBeenCalled();
  expect(sent).toMatchObject([{ type: 'refusal', id: 4, problems: [{ text: expect.stringContaining(name) }] }]);
});

it('a refusal of the engine goes to the window in words and is no bug', async () => {
  const problem = { code: 'disk-full', severity: 'error', where: 'out.csv' } as const;
  const { seat, sent, bugs } = seated(() => Promise.reject(new ProblemError([problem])));
  seat.take({ type: 'ask', id: 5, name: 'bench.save', params: {} });
  await vi.waitFor(() => expect(sent).toHaveLength(1));
  expect(sent[0]).toMatchObject({ type: 'refusal', id: 5, problems: [{ ...problem, text: expect.any(String) }] });
  expect(bugs).toEqual([]);
});

it('a bug is told to the door, and the window gets one line without a trace', async () => {
  const bug = new Error('no such thing\n    at somewhere (file.js:1:2)');
  const { seat, sent, bugs } = seated(() => Promise.reject(bug));
  seat.take({ type: 'ask', id: 6, name: 'bench.view', params: {} });
  await vi.waitFor(() => expect(sent).toHaveLength(1));
  expect(sent[0]).toMatchObject({ type: 'refusal', id: 6, problems: [{ code: 'program-fault' }] });
  expect(JSON.stringify(sent[0])).toMatch(/Your work is kept\. Please report this/);
  expect(JSON.stringify(sent[0])).toContain('no such thing');
  expect(JSON.stringify(sent[0])).not.toContain('somewhere');
  expect(bugs).toEqual([bug]);
});

it('a window that cannot be written to does not disturb the engine that tells it something', () => {
  const bugs: unknown[] = [];
  let tell: (name: never, data: never) => void = () => undefined;
  const engine = { handle: () => Promise.resolve(), listen: (heard: typeof tell) => ((tell = heard), () => undefined) };
  const gone = new Error('gone');
  seatWindow(
    engine as unknown as Served,
    () => {
      throw gone;
    },
    (bug) => bugs.push(bug),
  );
  expect(() => tell('bench' as never, {} as never)).not.toThrow();
  expect(bugs).toEqual([gone]);
});

it('events reach the window until it leaves', () => {
  const { seat, sent, tell, left } = seated(() => Promise.resolve(1));
  tell('progress', { label: 'Reading', share: 0.5 });
  expect(sent).toEqual([{ type: 'event', name: 'progress', data: { label: 'Reading', share: 0.5 } }]);
  seat.leave();
  expect(left).toHaveBeenCalled();
});
