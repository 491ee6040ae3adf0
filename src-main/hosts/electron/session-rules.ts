import type { Session } from 'electron';
import { isLoadable } from './app-address.ts';

/** What a session may not do: reach anything but the app itself, be granted anything, fetch dictionaries. */
export function applySessionRules(session: Session, isDevelopment: boolean): void {
  session.webRequest.onBeforeRequest(({ url }, answer) => answer({ cancel: !isLoadable(url, isDevelopment) }));
  session.setPermissionRequestHandler((_contents, _permission, answer) => answer(false));
  session.setPermissionCheckHandler(() => false);
  session.setDevicePermissionHandler(() => false);
  session.setDisplayMediaRequestHandler((_request, answer) => answer({}));
  session.setSpellCheckerEnabled(false);
  // What is saved comes from our own pages: a report, a figure, a table.
  session.on('will-download', (event, item) => {
    if (!isLoadable(item.getURL(), false)) event.preventDefault();
  });
}
