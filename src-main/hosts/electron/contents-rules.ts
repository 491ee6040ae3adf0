import type { WebContents } from 'electron';

/** What the contents of a window may not do: go elsewhere, open others, hold foreign pages. */
export function applyContentsRules(contents: WebContents): void {
  contents.on('will-navigate', (event) => event.preventDefault());
  contents.on('will-redirect', (event) => event.preventDefault());
  contents.on('will-frame-navigate', (event) => event.preventDefault());
  contents.on('will-attach-webview', (event) => event.preventDefault());
  contents.setWindowOpenHandler(() => ({ action: 'deny' }));
  // Without a proxy nothing leaves by this way at all.
  contents.setWebRTCIPHandlingPolicy('disable_non_proxied_udp');
}
