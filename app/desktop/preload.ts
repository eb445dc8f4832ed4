import { contextBridge, ipcRenderer } from 'electron';
import type { Packet } from '../contract/link';
import { TO_ENGINE, TO_WINDOW } from './channel';

contextBridge.exposeInMainWorld('halosieve', {
  send: (packet: Packet): void => ipcRenderer.send(TO_ENGINE, packet),
  onPacket(heard: (packet: Packet) => void): () => void {
    const listener = (_: unknown, packet: Packet): void => heard(packet);
    ipcRenderer.on(TO_WINDOW, listener);
    return () => ipcRenderer.off(TO_WINDOW, listener);
  },
});
