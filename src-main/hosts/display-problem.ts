/** Why no window can be shown here; null when one can. */
export function displayProblem(): string | null {
  if (process.platform !== 'linux') return null;
  return process.env['DISPLAY'] || process.env['WAYLAND_DISPLAY'] ? null : 'there is no display';
}
