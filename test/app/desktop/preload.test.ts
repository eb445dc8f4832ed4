import { expect, it, vi } from 'vitest';

const electron = vi.hoisted(() => ({
  exposed: new Map<string, Record<string, (...words: unknown[]) => unknown>>(),
  ipc: { send: vi.fn(), on: vi.fn(), off: vi.fn() },
}));
vi.mock('electron', () => ({
  contextBridge: { exposeInMainWorld: (name: string, api: never) => electron.exposed.set(name, api) },
  ipcRenderer: electron.ipc,
}));

it('the page is given the packets and nothing else: no event, no channel, no other message', async () => {
  await import('../../../app/desktop/preload');
  expect([...electron.exposed.keys()]).toEqual(['halosieve']);
  const bridge = electron.exposed.get('halosieve')!;
  expect(Object.keys(bridge).sort()).toEqual(['onPacket', 'send']);
  bridge['send']!({ type: 'ask' }, 'more');
  expect(electron.ipc.send.mock.calls).toEqual([['halosieve:to-engine', { type: 'ask' }]]);
  const heard = vi.fn();
  const deafen = bridge['onPacket']!(heard) as () => void;
  const [channel, listener] = electron.ipc.on.mock.calls[0]! as [string, (event: unknown, packet: unknown) => void];
  listener({ sender: 'main' }, { type: 'event' });
  expect(heard.mock.calls).toEqual([[{ type: 'event' }]]);
  deafen();
  expect(electron.ipc.off).toHaveBeenCalledWith(channel, listener);
});
