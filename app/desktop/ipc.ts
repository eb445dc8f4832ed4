import type { IpcMain, WebContents } from 'electron';
import type { Packet } from '../contract/link';
import { seatWindow, type Served, type WindowSeat } from '../contract/serve';
import { TO_ENGINE, TO_WINDOW } from './channel';
import { isWindowAddress } from './policy';

/** Seats every window of the application at the engine; packets of any other sender are dropped. */
export function connectWindows(
  ipc: Pick<IpcMain, 'on'>,
  engine: Served,
  bug: (error: unknown) => void,
): (contents: WebContents) => void {
  const seats = new Map<number, WindowSeat>();
  ipc.on(TO_ENGINE, (event, packet: unknown) => {
    const { senderFrame } = event;
    if (!senderFrame || senderFrame.parent !== null || !isWindowAddress(senderFrame.url)) return;
    seats.get(event.sender.id)?.take(packet);
  });
  return (contents) => {
    const send = (packet: Packet): void => {
      if (!contents.isDestroyed()) contents.send(TO_WINDOW, packet);
    };
    const seat = seatWindow(engine, send, bug);
    seats.set(contents.id, seat);
    contents.once('destroyed', () => {
      seat.leave();
      seats.delete(contents.id);
    });
  };
}
