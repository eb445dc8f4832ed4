import type { MenuItemConstructorOptions } from 'electron';

/** The native menu: what every program has; the bench's own commands stand in the window. */
export function menuTemplate(platform: string): MenuItemConstructorOptions[] {
  const mac: MenuItemConstructorOptions[] = platform === 'darwin' ? [{ role: 'appMenu' }] : [];
  return [
    ...mac,
    { label: 'Bench', submenu: [platform === 'darwin' ? { role: 'close' } : { role: 'quit' }] },
    {
      label: 'Edit',
      submenu: [{ role: 'cut' }, { role: 'copy' }, { role: 'paste' }, { role: 'selectAll' }],
    },
    {
      label: 'View',
      submenu: [
        { role: 'resetZoom' },
        { role: 'zoomIn' },
        { role: 'zoomOut' },
        { type: 'separator' },
        { role: 'togglefullscreen' },
      ],
    },
    { role: 'windowMenu' },
  ];
}
