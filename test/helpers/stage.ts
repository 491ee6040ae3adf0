import type { ConsoleMessage, Page, Request } from 'playwright-core';

/** Where a journey takes place: a window of Footing with a home of its own. */
export interface Stage {
  page: Page;
  /** FOOTING_HOME of the program behind the window: its projects, its reviewer and key. */
  home: string;
  /** What went wrong behind the journey's back so far: console errors, uncaught errors, requests that left the machine. */
  problems: string[];
  close(): Promise<void>;
}

export interface StageOptions {
  /** An existing home; otherwise a fresh one. */
  home?: string;
  isDemo?: boolean;
  projectPath?: string;
  width?: number;
  height?: number;
}

export type OpenStage = (options?: StageOptions) => Promise<Stage>;

/** Collects everything that a journey must not pass over in silence. */
export function watchPage(page: Page, isOwn: (url: string) => boolean): string[] {
  const problems: string[] = [];
  page.on('console', (message: ConsoleMessage) => {
    if (message.type() === 'error' || message.type() === 'warning')
      problems.push(`console ${message.type()}: ${message.text()} (${message.location().url})`);
  });
  page.on('pageerror', (error: Error) => problems.push(`uncaught: ${error.stack ?? error.message}`));
  page.on('request', (request: Request) => {
    if (!isOwn(request.url())) problems.push(`request that leaves the page: ${request.url()}`);
  });
  return problems;
}
