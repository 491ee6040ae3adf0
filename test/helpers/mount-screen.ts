import { enableAutoUnmount, flushPromises, mount, type VueWrapper } from '@vue/test-utils';
import { afterEach } from 'vitest';
import type { Component } from 'vue';
import type { Session } from '../../src-main/contract/project.ts';
import { createSession, sessionKey, type SessionStore } from '../../src-renderer/state/use-session.ts';
import { installFakeHost, type FakeHost } from './fake-host.ts';
import { inventedSession } from './invented-project.ts';

// What one test leaves on the page would answer the keys of the next.
enableAutoUnmount(afterEach);

export interface Screen {
  screen: VueWrapper;
  host: FakeHost;
  session: SessionStore;
}

interface ScreenOptions {
  props?: Record<string, unknown>;
  session?: Partial<Session>;
  /** Parts that need what the test's page lacks, such as a canvas, by name. */
  stubs?: string[];
  /** Replies that the screen needs as soon as it is there. */
  prepare?: (host: FakeHost) => void;
}

/** Puts one part of the interface on the page, in the session of an invented review, over a fake host. */
export async function mountScreen(component: Component, options: ScreenOptions = {}): Promise<Screen> {
  document.body.replaceChildren();
  const host = installFakeHost();
  host.reply('session.get', () => ({ ...inventedSession, ...options.session }));
  host.reply('project.view', () => ({ ...inventedSession, ...options.session }).project!);
  options.prepare?.(host);
  const session = createSession();
  await session.load();
  const screen = mount(component, {
    props: options.props,
    attachTo: document.body,
    global: { provide: { [sessionKey as symbol]: session }, stubs: options.stubs },
  });
  await flushPromises();
  return { screen, host, session };
}

/** The control that a label names. */
export function field(screen: VueWrapper, label: string) {
  const named = screen.findAll('label').find((one) => one.text() === label);
  if (!named) throw new Error(`no field is labelled “${label}”`);
  const inside = named.find('input');
  return inside.exists() ? inside : screen.find(`[id="${named.attributes('for')}"]`);
}

export function button(screen: VueWrapper, name: string) {
  const found = screen.findAll('button').find((one) => one.text() === name);
  if (!found) throw new Error(`no button is called “${name}”`);
  return found;
}

/** Gives files to a file chooser, as the system's dialog would. */
export async function choose(screen: VueWrapper, files: File[]): Promise<void> {
  const input = screen.find('input[type=file]');
  Object.defineProperty(input.element, 'files', { value: files, configurable: true });
  await input.trigger('change');
  await settled();
}

/** Until files are read, requests answered and the screen redrawn. */
export async function settled(): Promise<void> {
  for (let turn = 0; turn < 3; turn++) {
    await new Promise((resolve) => setTimeout(resolve, 5));
    await flushPromises();
  }
}
