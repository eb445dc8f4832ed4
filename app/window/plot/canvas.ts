/** The context of a canvas that fits its place at the screen's resolution, wiped; its state is saved. */
export function prepared(canvas: HTMLCanvasElement): CanvasRenderingContext2D | null {
  const context = canvas.getContext('2d');
  const scale = window.devicePixelRatio;
  const [width, height] = [canvas.clientWidth * scale, canvas.clientHeight * scale];
  if (canvas.width !== width || canvas.height !== height) [canvas.width, canvas.height] = [width, height];
  context?.setTransform(scale, 0, 0, scale, 0, 0);
  context?.clearRect(0, 0, canvas.clientWidth, canvas.clientHeight);
  context?.save();
  return context;
}
